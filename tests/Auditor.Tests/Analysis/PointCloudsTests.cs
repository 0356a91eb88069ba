using Auditor.Analysis;
using Auditor.Results;

namespace Auditor.Tests.Analysis;

public sealed class PointCloudsTests
{
    private const int Many = 20_000;

    [Fact]
    public void Few_points_stay_as_they_are()
    {
        var points = Scattered(PointClouds.MostPoints);
        var cloud = PointClouds.Of(points, trend: false);
        Assert.Same(points, cloud.Points);
        Assert.False(cloud.Binned);
    }

    [Fact]
    public void Many_points_become_few_that_stand_for_all()
    {
        var cloud = PointClouds.Of(Scattered(Many), trend: false);
        Assert.True(cloud.Binned);
        Assert.Equal(Many, cloud.Rows);
        Assert.InRange(cloud.Points.Count, 200, PointClouds.MostPoints);
        Assert.Equal(Many, cloud.Points.Sum(point => point.Count));
    }

    [Fact]
    public void The_outermost_points_stand_alone_where_they_are()
    {
        var points = Scattered(Many);
        PlotPoint[] outermost =
        [
            .. points.OrderBy(point => point.X).Take(25), .. points.OrderByDescending(point => point.X).Take(25),
            .. points.OrderBy(point => point.Y).Take(25), .. points.OrderByDescending(point => point.Y).Take(25),
        ];
        var drawn = PointClouds.Of(points, trend: false).Points.ToHashSet();
        Assert.All(outermost, point => Assert.Contains(point, drawn));
    }

    [Fact]
    public void Cells_keep_the_centre_of_all_points()
    {
        var points = Scattered(Many);
        var drawn = PointClouds.Of(points, trend: false).Points;
        Assert.Equal(points.Average(point => point.X), drawn.Sum(point => point.X * point.Count) / Many, 1e-9);
        Assert.Equal(points.Average(point => point.Y), drawn.Sum(point => point.Y * point.Count) / Many, 1e-9);
    }

    [Fact]
    public void One_value_for_all_is_one_cell_and_no_trend()
    {
        PlotPoint[] same = [.. Enumerable.Repeat(new PlotPoint(3, 4, 1), Many)];
        var cloud = PointClouds.Of(same, trend: true);
        Assert.Empty(cloud.Trend);
        Assert.All(cloud.Points, point => Assert.Equal((3.0, 4.0), (point.X, point.Y)));
    }

    /// <summary>Source: on y = 2 x the mean of y in any run is twice the mean of x.</summary>
    [Fact]
    public void The_trend_is_the_mean_of_runs()
    {
        var trend = PointClouds.Of([.. Enumerable.Range(0, 1000).Select(x => new PlotPoint(x, 2 * x, 1))], trend: true).Trend;
        Assert.Equal(20, trend.Count);
        Assert.All(trend, point => Assert.Equal(2 * point.X, point.Y, 1e-9));
        Assert.Equal(24.5, trend[0].X, 1e-9);
    }

    [Fact]
    public void Few_rows_have_no_trend() => Assert.Empty(PointClouds.Of(Scattered(39), trend: true).Trend);

    /// <summary>Points on a spiral: no two alike, both directions filled, no chance in it.</summary>
    private static PlotPoint[] Scattered(int count) =>
        [.. Enumerable.Range(1, count).Select(i => new PlotPoint(Math.Sqrt(i) * Math.Cos(2.4 * i), Math.Sqrt(i) * Math.Sin(2.4 * i), 1))];
}
