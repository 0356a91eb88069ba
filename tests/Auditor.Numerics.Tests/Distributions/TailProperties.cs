using Auditor.Numerics.Distributions;
using CsCheck;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>What holds for every argument, over ranges far wider than any regression needs.</summary>
public sealed class TailProperties
{
    private const int Cases = 2000;
    private const int NoncentralCases = 400; // some cost milliseconds

    private static readonly Gen<double> Df1 = Scale(0.5, 5000);
    private static readonly Gen<double> Df2 = Scale(0.5, 1e10);
    private static readonly Gen<double> F = Scale(1e-12, 1e12);
    private static readonly Gen<double> Lambda = Scale(1e-12, 1e7);

    [Fact]
    public void Survival_and_cumulative_add_up_to_1() =>
        Gen.Select(F, Df1, Df2).Sample((f, df1, df2) =>
            Math.Abs(FisherF.Survival(f, df1, df2) + FisherF.Cumulative(f, df1, df2) - 1) < 1e-14, iter: Cases);

    [Fact]
    public void Log_survival_is_the_logarithm_of_survival() =>
        Gen.Select(F, Df1, Df2).Sample((f, df1, df2) =>
        {
            double survival = FisherF.Survival(f, df1, df2);
            double log = FisherF.LogSurvival(f, df1, df2);
            return survival < 1e-300 ? log < -690 : Math.Abs(Math.Log(survival) - log) < 1e-13 * Math.Max(1, -log);
        }, iter: Cases);

    [Fact]
    public void Log_survival_falls_in_f() =>
        Gen.Select(F, Gen.Double[1e-6, 3], Df1, Df2).Sample((f, more, df1, df2) =>
        {
            double before = FisherF.LogSurvival(f, df1, df2);
            double after = FisherF.LogSurvival(f * (1 + more), df1, df2);
            return after <= before && (before > -1e-300 || after < before);
        }, iter: Cases);

    [Fact]
    public void Quantile_is_the_inverse_of_survival() =>
        Gen.Select(Scale(1e-290, 0.9999), Df1, Df2).Sample((p, df1, df2) =>
        {
            double f = FisherF.UpperQuantile(p, df1, df2);
            return double.IsInfinity(f) || Math.Abs((FisherF.Survival(f, df1, df2) / p) - 1) < 1e-10;
        }, iter: Cases);

    [Fact]
    public void Exchanging_the_degrees_of_freedom_inverts_f() =>
        Gen.Select(Scale(1e-3, 1e3), Df1, Df1).Sample((f, df1, df2) =>
            Math.Abs((FisherF.Survival(f, df1, df2) / FisherF.Cumulative(1 / f, df2, df1)) - 1) < 1e-10
            || FisherF.Survival(f, df1, df2) < 1e-300, iter: Cases);

    [Fact]
    public void Squared_t_is_F() =>
        Gen.Select(Scale(1e-6, 1e6), Df2).Sample((t, df) =>
            StudentT.TwoSided(t, df) == FisherF.Survival(t * t, 1, df) && StudentT.TwoSided(-t, df) == StudentT.TwoSided(t, df), iter: Cases);

    [Fact]
    public void Squared_t_quantile_is_the_F_quantile() =>
        Gen.Select(Scale(1e-30, 0.49), Df2).Sample((p, df) =>
        {
            double t = StudentT.UpperQuantile(p, df);
            return double.IsInfinity(t * t) || Math.Abs((t * t / FisherF.UpperQuantile(2 * p, 1, df)) - 1) < 1e-12;
        }, iter: Cases);

    [Fact]
    public void Noncentral_survival_and_cumulative_add_up_to_1() =>
        Gen.Select(F, Df1, Df2, Lambda).Sample((f, df1, df2, lambda) =>
            Math.Abs(NoncentralF.Survival(f, df1, df2, lambda) + NoncentralF.Cumulative(f, df1, df2, lambda) - 1) < 1e-11, iter: NoncentralCases);

    /// <summary>F' near where it lies, so that neither tail is trivial.</summary>
    [Fact]
    public void Noncentral_tails_near_the_mean_add_up_to_1() =>
        Gen.Select(Gen.Double[0.5, 2], Df1, Df2, Scale(1e-3, 1e12)).Sample((share, df1, df2, lambda) =>
        {
            double f = share * (1 + (lambda / df1));
            return Math.Abs(NoncentralF.Survival(f, df1, df2, lambda) + NoncentralF.Cumulative(f, df1, df2, lambda) - 1) < 1e-11;
        }, iter: NoncentralCases);

    [Fact]
    public void Noncentral_cumulative_falls_in_lambda_and_grows_in_f() =>
        Gen.Select(F, Df1, Df2, Lambda, Gen.Double[1e-3, 2]).Sample((f, df1, df2, lambda, more) =>
        {
            double here = NoncentralF.Cumulative(f, df1, df2, lambda);
            return NoncentralF.Cumulative(f, df1, df2, lambda * (1 + more)) <= here * (1 + 1e-11)
                && NoncentralF.Cumulative(f * (1 + more), df1, df2, lambda) >= here * (1 - 1e-11);
        }, iter: NoncentralCases);

    [Fact]
    public void Noncentral_survival_grows_in_lambda_and_falls_in_f() =>
        Gen.Select(F, Df1, Df2, Lambda, Gen.Double[1e-3, 2]).Sample((f, df1, df2, lambda, more) =>
        {
            double here = NoncentralF.Survival(f, df1, df2, lambda);
            return NoncentralF.Survival(f, df1, df2, lambda * (1 + more)) >= here * (1 - 1e-11)
                && NoncentralF.Survival(f * (1 + more), df1, df2, lambda) <= here * (1 + 1e-11);
        }, iter: NoncentralCases);

    /// <summary>Up to noncentralities of 1e8: beyond, the rounding of lambda alone moves a small probability by more than 1e-10.</summary>
    [Fact]
    public void Noncentrality_has_the_cumulative_asked_for_or_is_0() =>
        Gen.Select(Scale(1e-4, 1e4), Df1, Df2, Scale(1e-200, 0.999)).Sample((f, df1, df2, p) =>
        {
            double? lambda = NoncentralF.Noncentrality(f, df1, df2, p);
            return lambda is 0 ? FisherF.Cumulative(f, df1, df2) <= p : Math.Abs((NoncentralF.Cumulative(f, df1, df2, lambda ?? double.NaN) / p) - 1) < 1e-10;
        }, iter: NoncentralCases);

    [Fact]
    public void Noncentrality_for_power_has_the_power_asked_for_or_is_0() =>
        Gen.Select(Scale(1e-4, 1e4), Df1, Df2, Scale(1e-200, 0.999)).Sample((f, df1, df2, p) =>
        {
            double? lambda = NoncentralF.NoncentralityForPower(f, df1, df2, p);
            return lambda is 0 ? FisherF.Survival(f, df1, df2) >= p : Math.Abs((NoncentralF.Survival(f, df1, df2, lambda ?? double.NaN) / p) - 1) < 1e-10;
        }, iter: NoncentralCases);

    /// <summary>Spread evenly over the logarithm.</summary>
    private static Gen<double> Scale(double low, double high) => Gen.Double[Math.Log(low), Math.Log(high)].Select(Math.Exp);
}
