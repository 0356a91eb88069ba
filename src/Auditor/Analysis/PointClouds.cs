using Auditor.Numerics.Pictures;
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

    /// <summary>A cloud that was made small while the rows were read.</summary>
    public static PointCloud Of(PointGrid grid, bool trend)
    {
        return new PointCloud([.. grid.Points.Select(Point)], (int)grid.Count, grid.Binned, trend && grid.Count >= FewestForTrend ? Trend([.. grid.Columns.Select(Point)]) : []);
    }

    private static PlotPoint Point(GridPoint point) => new(point.X, point.Y, point.Count);

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
        return [.. Ends(points, point => point.X), .. Ends(points, point => point.Y)];
    }

    /// <summary>The order is asked for its two ends only: a part of a sequence in order costs no full sort.</summary>
    private static IEnumerable<int> Ends(IReadOnlyList<PlotPoint> points, Func<PlotPoint, double> coordinate)
    {
        var order = Enumerable.Range(0, points.Count).OrderBy(index => coordinate(points[index]));
        return order.Take(AloneOnEachSide).Concat(order.Skip(Math.Max(0, points.Count - AloneOnEachSide)));
    }

    private static PlotPoint[] Trend(IReadOnlyList<PlotPoint> points)
    {
        PlotPoint[] ordered = [.. points.OrderBy(point => point.X)];
        if (ordered[0].X == ordered[^1].X)
        {
            return [];
        }

        var count = ordered.Sum(point => point.Count);
        var runs = Math.Min(LongestTrend, Math.Ceiling(count / (FewestForTrend / 4)));
        return [.. Runs(ordered, count / runs).Select(Mean)];
    }

    /// <summary>Neighbours that stand for about that many rows; equal places stay together.</summary>
    private static IEnumerable<List<PlotPoint>> Runs(PlotPoint[] ordered, double size)
    {
        var (run, count) = (new List<PlotPoint>(), 0.0);
        foreach (var place in ordered.GroupBy(point => point.X))
        {
            run.AddRange(place);
            count += place.Sum(point => point.Count);
            if (count >= size)
            {
                yield return run;
                (run, count) = ([], 0);
            }
        }

        if (run.Count > 0)
        {
            yield return run;
        }
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
