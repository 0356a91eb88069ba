using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Wald test robust to serial dependence, unrestricted. Null: all coefficients of the group's columns in F + group are zero. V = T O / k with T O the long-run
/// variance by cosines (<see cref="Cosines"/>) of the sums of qz_i e_i(F+g) by period, and k = (T/(nu q)) sum_a |C diag(qz_a) (I - H)|² its mean under
/// independent errors of variance 1 (C the nu x n cosines of the rows' periods, H of F + group).
/// F = (nu - q + 1)/(nu q) u'V^-1 u on (q, nu - q + 1). Effective rows and the negligible-effect test of the time form rest on it.
/// </summary>
/// <param name="Covariance">V of u, q x q; null when the test has no value.</param>
/// <param name="BiasFactor">k; null likewise.</param>
/// <remarks>The project's own correction of the form of Lazarus, Lewis, Stock and Watson 2018. Verified against tests/vectors/effective_rows.json and by brute force.</remarks>
public sealed record PeriodWald(TestResult Test, double[,]? Covariance = null, double? BiasFactor = null)
{
    private const double MostWork = 2e10;

    public static PeriodWald Of(AddedGroup group, ClassSums periods)
    {
        if (PeriodF.Why(group, periods) is Impediment impediment)
        {
            return new PeriodWald(TestResult.None(impediment));
        }

        var cosines = new Cosines(periods.Count);
        if (periods.Moments is null || (double)periods.Count * cosines.Count * group.Rank * group.RankWith > MostWork)
        {
            return new PeriodWald(TestResult.None(Impediment.TooManyPeriods));
        }

        var raw = cosines.Variance(group.Rank, periods.ResidualScore);
        var bias = Bias(group, periods.Moments, cosines, periods.Count);
        return bias > 0 && Quadratic.Form(group.U, raw, Impediments.MeanSquare(group)) is double form
            ? new PeriodWald(PeriodF.Hotelling(bias * form, group.Rank, cosines.Count), Quadratic.Scaled(raw, 1 / bias), bias)
            : new PeriodWald(TestResult.None(Impediment.SingularCovariance));
    }

    /// <summary>|C diag(qz_a) (I - H)|² = |C diag(qz_a)|² - |C diag(qz_a) Q|², both from the sums by period.</summary>
    private static double Bias(AddedGroup group, ClassMoments moments, Cosines cosines, int periods)
    {
        var (q, sum) = (group.Rank, 0.0);
        for (var j = 1; j <= cosines.Count; j++)
        {
            for (var a = 0; a < q; a++)
            {
                sum += OneColumn(group, moments, cosines, periods, j, a);
            }
        }

        return periods / ((double)cosines.Count * q) * sum;
    }

    private static double OneColumn(AddedGroup group, ClassMoments moments, Cosines cosines, int periods, int j, int a)
    {
        var (final, own, squares) = (new double[group.Final.Rank], new double[group.Rank], 0.0);
        for (var t = 0; t < periods; t++)
        {
            var cosine = cosines.At(j, t);
            squares += cosine * cosine * moments.Squares(t, a)[a];
            BlockKernels.AddScaled(final, cosine, moments.Cross(t, a));
            BlockKernels.AddScaled(own, cosine, moments.Squares(t, a));
        }

        return squares - BlockKernels.Dot(final, final) - BlockKernels.Dot(own, own);
    }
}
