namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Correlation of residuals a number of periods apart: the sum of products of residuals, both about the mean, over the pairs of rows of one unit exactly that many
/// periods apart, over the sum of squares of all residuals; of weighted fits sqrt(w) e. Pairs that a missing period or the edge of a unit keeps apart are not counted, so
/// with fewer pairs the value shrinks, and its band with it.
/// </summary>
/// <param name="Lag">Periods apart.</param>
/// <param name="Value">r, between -1 and 1.</param>
/// <param name="Pairs">m, the pairs counted.</param>
/// <remarks>As in Ljung and Box 1978. Verified against R's acf for one series, and against R from the definition for units and gaps (tests/Auditor.Tests/Analysis/values).</remarks>
public readonly record struct Autocorrelation(int Lag, double Value, int Pairs)
{
    private const double NormalQuantile = 1.959963984540054;

    /// <summary>Half the width of the band that holds r of independent errors in 95 of 100 samples: 1.96 sqrt(m / (n (n + 2))), the scale of Ljung and Box.</summary>
    /// <param name="rows">n.</param>
    public double Band(int rows) => NormalQuantile * Math.Sqrt(Pairs / (rows * (rows + 2.0)));

    /// <summary>Lags 1 to a number; null when the fit has nothing to correlate: no residuals, all equal, or rows that stand for several.</summary>
    public static IReadOnlyList<Autocorrelation>? Of(SerialFit fit, int lags) =>
        fit.Impediment is null ? [.. Enumerable.Range(1, lags).Select(lag => At(fit, lag))] : null;

    internal static Autocorrelation At(SerialFit fit, int lag)
    {
        var residuals = fit.Residuals;
        var pairs = fit.Order.Lag(lag);
        var mean = residuals.Average();
        var products = residuals.Select((value, t) => pairs[t] >= 0 ? (value - mean) * (residuals[pairs[t]] - mean) : 0).Sum();
        return new Autocorrelation(lag, products / residuals.Sum(value => (value - mean) * (value - mean)), pairs.Count(at => at >= 0));
    }
}
