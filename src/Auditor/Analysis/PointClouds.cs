using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Makes a cloud of any number of rows small enough to draw: above a limit, cells of a fixed grid with their counts; the points furthest out always stand alone.</summary>
internal static class PointClouds
{
    public const int MostPoints = 1500;
    private const int Across = 40;
    private const int Down = 30;
    private const int AloneOnEachSide = 25;
    private const int FewestForTrend = 40;
    private const int LongestTrend = 20;

    public static PointCloud Of(IReadOnlyList<PlotPoint> points, bool trend)
    {
        var line = trend && points.Count >= FewestForTrend ? Trend(points) : [];
        return points.Count <= MostPoints
            ? new PointCloud(points, points.Count, false, line)
            : new PointCloud(Binned(points), points.Count, true, line);
    }

    private static List<PlotPoint> Binned(IReadOnlyList<PlotPoint> points)
    {
        var alone = Outermost(points);
        PlotPoint[] inner = [.. points.Where((_, index) => !alone.Contains(index))];
        var (x, y) = (Cells.Of(inner.Select(point => point.X), Across), Cells.Of(inner.Select(point => point.Y), Down));
        var cells = inner.GroupBy(point => (Y: y.Index(point.Y), X: x.Index(point.X))).OrderBy(cell => cell.Key).Select(Mean);
        return [.. cells, .. alone.Order().Select(index => points[index])];
    }

    /// <summary>Positions of the lowest and highest points in either direction.</summary>
    private static HashSet<int> Outermost(IReadOnlyList<PlotPoint> points)
    {
        int[] byX = [.. Enumerable.Range(0, points.Count).OrderBy(index => points[index].X)];
        int[] byY = [.. Enumerable.Range(0, points.Count).OrderBy(index => points[index].Y)];
        return [.. new[] { byX, byY }.SelectMany(order => order.Take(AloneOnEachSide).Concat(order.TakeLast(AloneOnEachSide)))];
    }

    private static PlotPoint[] Trend(IReadOnlyList<PlotPoint> points)
    {
        PlotPoint[] ordered = [.. points.OrderBy(point => point.X)];
        if (ordered[0].X == ordered[^1].X)
        {
            return [];
        }

        var runs = Math.Min(LongestTrend, ordered.Length / (FewestForTrend / 4));
        return [.. ordered.Chunk((ordered.Length + runs - 1) / runs).Select(Mean)];
    }

    private static PlotPoint Mean(IEnumerable<PlotPoint> points)
    {
        var (x, y, count) = (0.0, 0.0, 0.0);
        foreach (var point in points)
        {
            count += point.Count;
            x += (point.X - x) * point.Count / count;
            y += (point.Y - y) * point.Count / count;
        }

        return new PlotPoint(x, y, count);
    }

    /// <summary>Equal cells over the range of some values.</summary>
    private sealed record Cells(double Low, double Width, int Count)
    {
        public static Cells Of(IEnumerable<double> values, int count)
        {
            var all = values.ToList();
            var (low, high) = (all.Min(), all.Max());
            return new Cells(low, (high - low) / count, count);
        }

        public int Index(double value) => Width > 0 ? (int)Math.Clamp((value - Low) / Width, 0, Count - 1) : 0;
    }
}
