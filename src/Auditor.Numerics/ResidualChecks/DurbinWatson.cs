using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Durbin–Watson check. Null: the errors are not correlated from one period to the next; against positive correlation. d = sum (e_t - e_(t-1))² / sum e², the first sum over
/// rows whose unit has a row one period earlier, pooled over units; of weighted fits sqrt(w) e. p = P(d &lt;= observed) under normal errors
/// of equal variance: exact to n = 2,000, above that the normal law with d's exact mean and variance. Not with a lag of the response among the terms.
/// </summary>
/// <remarks>
/// Durbin and Watson 1971, Biometrika 58; Imhof 1961, Biometrika 48; pooled over units: Bhargava, Franzini and Narendranathan 1982, Review of Economic Studies 49 (from memory).
/// d, exact p and normal p verified against R (tests/reference), bounds against published tables (tests/reference/tables.json), small p against 60-digit integration
/// (ResidualChecks/values of the tests). Variance of d below 1e-12: d is the same whatever the errors, no check.
/// </remarks>
public static class DurbinWatson
{
    private const int MostExact = 2000;
    private const double NoVariance = 1e-12;

    /// <summary>The line of integration keeps away from where the transform may have its first pole.</summary>
    private const double Inside = 0.999;

    public static CheckOutcome Of(SerialFit fit)
    {
        if ((fit.Impediment ?? fit.LaggedResponse) is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var lag = fit.Order.Lag(1);
        bool[] linked = [.. lag.Select(at => at >= 0)];
        var e = fit.Residuals;
        var total = e.Sum(value => value * value);
        var d = e.Select((value, t) => linked[t] ? Square(value - e[lag[t]]) : 0).Sum() / total;
        var first = e.Select((value, t) => linked[t] ? value * e[lag[t]] : 0).Sum() / total;
        var differences = new SerialDifferences(ResidualMaker.Of(fit.Fit.Design).Arranged(fit.Order.Positions), linked);
        return d <= 0 || differences.Df < 2 || differences.Variance <= NoVariance
            ? CheckOutcome.None(CheckImpediment.TooFew)
            : Check(d, differences) with
            {
                Sizes = [new(SizeMeasure.FirstAutocorrelation, first)],
                WithinUnits = fit.Order.Units > 1 ? fit.Order.Units : null,
            };
    }

    private static double Square(double value) => value * value;

    private static CheckStatistic Check(double d, SerialDifferences differences)
    {
        var exact = differences.Rows <= MostExact;
        var log = exact ? Exact(d, differences) : Normal((d - differences.Mean) / Math.Sqrt(differences.Variance));
        return new CheckStatistic(d, null, null, Math.Exp(log)) { LogP = log, NormalApproximation = !exact };
    }

    /// <summary>log P(e'(A - dI)e &lt; 0). Eigenvalues of A lie in [0, 4), so the transform is analytic between -1/(2d) and 1/(2(4 - d)).</summary>
    private static double Exact(double d, SerialDifferences differences)
    {
        var below = d <= differences.Mean;
        var log = SaddleIntegral.LogTail(s => differences.LogTransform(s, d), Inside * (below ? -1 / (2 * d) : 1 / (2 * (4 - d))));
        return below ? Math.Min(0, log) : Math.Log(Math.Max(0, 1 - Math.Exp(log)));
    }

    private static double Normal(double z) => z < 0 ? StandardNormal.LogUpperTail(-z) : Math.Log(1 - StandardNormal.UpperTail(z));
}
