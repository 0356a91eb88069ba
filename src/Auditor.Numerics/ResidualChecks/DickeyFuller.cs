using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// The augmented Dickey–Fuller regression of a series of n values, without constant: the change on the value before and the k changes before. k minimises
/// AIC over 0 to ceil(12 (n/100)^¼), at most n/2 - 1, all on the rows that the most lags leave; the regression is then made on all rows that k leaves.
/// </summary>
/// <param name="T">The t ratio of the value before; null when the regression has no residuals or no unique solution.</param>
/// <param name="Persistence">1 plus its coefficient.</param>
/// <remarks>Said and Dickey 1984, Biometrika 71; most lags: Schwert 1989 (from memory). The choice is that of statsmodels' adfuller, against which it is verified.</remarks>
internal sealed record DickeyFuller(double? T, double Persistence, int Lags)
{
    public static DickeyFuller Of(double[] series)
    {
        var most = Math.Min((int)Math.Ceiling(12 * Math.Pow(series.Length / 100.0, 0.25)), (series.Length / 2) - 1);
        var lags = Choose(series, most);
        double[][] columns = [.. Enumerable.Range(1, lags).Select(k => Changes(series, lags, k)), Values(series, lags)];
        var final = FinalFactor.Of(FactorBuilder.Build(new MemoryRows(columns, Changes(series, lags, 0))));
        var df = final.Factor.Totals.N - final.Rank;
        if (final.Rank < columns.Length || df <= 0 || PerfectFit.Is(final, final.Rss))
        {
            return new DickeyFuller(null, 0, lags);
        }

        var (pivot, along) = (final.Triangle[lags, lags], final.Explained(final.Factor.Layout.Response)[^1]);
        return new DickeyFuller(along * Math.Sign(pivot) / Math.Sqrt(final.Rss / df), 1 + (along / pivot), lags);
    }

    /// <summary>Models with more lags are nested: one factor gives every residual sum of squares.</summary>
    private static int Choose(double[] series, int most)
    {
        double[][] columns = [Values(series, most), .. Enumerable.Range(1, most).Select(k => Changes(series, most, k))];
        var factor = FactorBuilder.Build(new MemoryRows(columns, Changes(series, most, 0)));
        var response = factor.R.Column(factor.Layout.Response).ToArray();
        var n = factor.Totals.N;
        double Aic(int lags) => (n * Math.Log(response.Skip(lags + 1).Sum(value => value * value) / n)) + (2 * (lags + 1));
        return Enumerable.Range(0, most + 1).MinBy(Aic);
    }

    /// <summary>The change of that many periods before, for rows that have so many changes before them.</summary>
    private static double[] Changes(double[] series, int lost, int before) =>
        [.. Enumerable.Range(lost + 1, series.Length - lost - 1).Select(t => series[t - before] - series[t - before - 1])];

    private static double[] Values(double[] series, int lost) =>
        [.. Enumerable.Range(lost + 1, series.Length - lost - 1).Select(t => series[t - 1])];
}
