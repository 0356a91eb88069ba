using Auditor.Numerics.Collinearity;
using Auditor.Numerics.Distributions;
using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics;

/// <summary>
/// Least squares fit of the final model on one row set: n observations, rank r. Coefficients are for columns as declared, refined once in
/// double-double. Weighted fits minimise sum w e².
/// </summary>
/// <remarks>Verified against certified values of NIST StRD, R's lm and 100-digit arithmetic (tests/reference).</remarks>
public sealed class Fit
{
    private readonly FinalFactor _final;

    public Fit(FinalFactor final, RowPassResult pass)
    {
        _final = final;
        Perfect = PerfectFit.Is(final, final.Rss);
        Rss = Perfect ? Math.Min(final.Rss, pass.Coefficients.Rss) : pass.Coefficients.Rss;
        Coefficients = pass.Coefficients.Values;
        Sigma = ResidualDf > 0 ? Math.Sqrt(Rss / ResidualDf) : null;
        StandardErrors = Sigma is double sigma ? [.. UnscaledErrors(final).Select(error => error * sigma)] : null;
        TrustworthyDigits = Digits.Of(pass.Coefficients, StandardErrors);
        Condition = ConditionIndices.Of(final);
        ConditionNumber = Condition.Indices.DefaultIfEmpty(1).Max();
    }

    /// <summary>Design columns of the coefficients, in order; r of them.</summary>
    public IReadOnlyList<int> Columns => _final.Kept;

    public IReadOnlyList<double> Coefficients { get; }

    /// <summary>Classical standard errors, null when no degrees of freedom are left.</summary>
    public IReadOnlyList<double>? StandardErrors { get; }

    public double N => _final.Factor.Totals.N;

    public int Rank => _final.Rank;

    public double ResidualDf => N - Rank;

    public double Rss { get; }

    /// <summary>sqrt(RSS / (n - r)); null without residual degrees of freedom.</summary>
    public double? Sigma { get; }

    /// <summary>The residuals are nothing but rounding.</summary>
    public bool Perfect { get; }

    /// <summary>Decimal digits of the least certain coefficient that a change in the last bit of the data leaves.</summary>
    public double TrustworthyDigits { get; }

    public ConditionIndices Condition { get; }

    /// <summary>Largest scaled condition index: columns as declared at unit length, the intercept included.</summary>
    public double ConditionNumber { get; }

    /// <summary>Sum of squares that the fit explains: about the mean with an intercept, about zero without.</summary>
    public double ExplainedSumOfSquares
    {
        get
        {
            var explained = _final.Explained(_final.Factor.Layout.Response);
            var rest = _final.Factor.Layout.Intercept ? explained[1..] : explained;
            return BlockKernels.Dot(rest, rest);
        }
    }

    /// <summary>1 - RSS / TSS, TSS about the mean with an intercept and about zero without; null when the response does not vary.</summary>
    public double? RSquared => Ratio(ExplainedSumOfSquares, ExplainedSumOfSquares + Rss);

    /// <summary>1 - (1 - R²) (n - i) / (n - r), i = 1 with an intercept; null without residual degrees of freedom.</summary>
    public double? AdjustedRSquared => RSquared is double r && ResidualDf > 0 ? 1 - ((1 - r) * (N - Intercepts) / ResidualDf) : null;

    /// <summary>Null: all coefficients but the intercept are zero. F on (r - i, n - r).</summary>
    public TestResult OverallF
    {
        get
        {
            if (Rank == Intercepts)
            {
                return TestResult.None(Impediment.AddsNothing);
            }

            if (PerfectFit.Is(_final, ExplainedSumOfSquares + Rss))
            {
                return TestResult.None(Impediment.PerfectWithoutGroup);
            }

            if (Perfect || Sigma is not double sigma)
            {
                return Perfect && ResidualDf > 0
                    ? new PerfectWithGroup(Rank - Intercepts, ResidualDf)
                    : TestResult.None(Impediment.NoResidualDegreesOfFreedom);
            }

            return TestResult.F(ExplainedSumOfSquares / (Rank - Intercepts) / (sigma * sigma), Rank - Intercepts, ResidualDf);
        }
    }

    /// <summary>Gaussian, sigma² = RSS / n, plus half the sum of the logs of the weights; null for a perfect fit.</summary>
    public double? LogLikelihood => Perfect || Rss == 0
        ? null
        : (-N / 2 * (Math.Log(2 * Math.PI * Rss / N) + 1)) + (_final.Factor.Totals.SumOfLogWeights / 2);

    /// <summary>-2 log L + 2 (r + 1): sigma counts as a parameter.</summary>
    public double? Aic => LogLikelihood is double l ? (-2 * l) + (2 * (Rank + 1)) : null;

    /// <summary>-2 log L + log(n) (r + 1).</summary>
    public double? Bic => LogLikelihood is double l ? (-2 * l) + (Math.Log(N) * (Rank + 1)) : null;

    private int Intercepts => _final.Factor.Layout.Intercept ? 1 : 0;

    /// <summary>Half the width of a coefficient's classical interval at 1 - alpha, in standard errors.</summary>
    public double? IntervalHalfWidth(double alpha) => ResidualDf > 0 ? StudentT.UpperQuantile(alpha / 2, ResidualDf) : null;

    private static double? Ratio(double part, double whole) => whole > 0 ? part / whole : null;

    private static double[] UnscaledErrors(FinalFactor final)
    {
        var errors = (final.PreciseTriangle?.InverseRowSquares() ?? Triangle.InverseRowSquares(final.Triangle, final.Rank)).Select(Math.Sqrt).ToArray();
        if (final.Factor.Layout.Intercept)
        {
            errors[0] = ConstantError(final, [.. final.Kept.Select((column, k) => k == 0 ? 1 : -final.Factor.Shifts[column])]);
        }

        return errors;
    }

    /// <summary>The declared constant is the shifted one minus the slopes times their shifts: its variance is |R^-T a|².</summary>
    private static double ConstantError(FinalFactor final, double[] a)
    {
        if (final.PreciseTriangle is { } precise)
        {
            DoubleDouble[] exact = [.. a.Select(DoubleDouble.Of)];
            precise.SolveTransposed(exact);
            return DoubleDouble.Sqrt(DoubleDoubleMatrix.Dot(exact, exact)).Value;
        }

        Triangle.SolveTransposed(final.Triangle, a);
        return Math.Sqrt(BlockKernels.Dot(a, a));
    }
}
