using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Standardised residuals in order against what order statistics of as many normal values would be, with a pointwise envelope of 95 %.</summary>
internal static class NormalPlots
{
    private const double Low = 0.025;
    private const double Median = 0.5;
    private const double High = 0.975;
    private const int WholeEnds = 250;

    /// <param name="residuals">Each with the number of observations it stands for.</param>
    public static NormalPlot Of(IEnumerable<(double Residual, double Copies)> residuals)
    {
        (double Residual, double Copies)[] ordered = [.. residuals.OrderBy(item => item.Residual)];
        var ranks = Ranks(ordered);
        var n = ordered.Sum(item => item.Copies);
        NormalPoint[] points = [.. Shown(ordered.Length).Select(index => Point(ordered[index].Residual, ranks[index], n))];
        return new NormalPlot(points, n, points.Count(point => point.Residual < point.Lower || point.Residual > point.Upper));
    }

    private static NormalPoint Point(double residual, double rank, double n) => new(
        NormalOrderStatistic.Quantile(Median, rank, n), residual, NormalOrderStatistic.Quantile(Low, rank, n), NormalOrderStatistic.Quantile(High, rank, n));

    /// <summary>The middle rank of the observations that a row stands for.</summary>
    private static double[] Ranks((double Residual, double Copies)[] ordered)
    {
        var ranks = new double[ordered.Length];
        var before = 0.0;
        for (var index = 0; index < ordered.Length; index++)
        {
            ranks[index] = before + ((ordered[index].Copies + 1) / 2);
            before += ordered[index].Copies;
        }

        return ranks;
    }

    /// <summary>All positions, or both ends whole and equal steps between.</summary>
    private static IEnumerable<int> Shown(int count)
    {
        if (count <= PointClouds.MostPoints)
        {
            return Enumerable.Range(0, count);
        }

        const int between = PointClouds.MostPoints - (2 * WholeEnds);
        var middle = Enumerable.Range(0, between).Select(step => WholeEnds + (int)((long)step * (count - (2 * WholeEnds)) / between));
        return [.. Enumerable.Range(0, WholeEnds), .. middle, .. Enumerable.Range(count - WholeEnds, WholeEnds)];
    }
}
