using Auditor.Numerics.Pictures;
using CsCheck;

namespace Auditor.Numerics.Tests.Pictures;

public class PointGridTests
{
    private const int Alone = 50;
    private const int MostCells = 96 * 64;

    [Fact]
    public void FewPointsStandAloneInTheirOrder()
    {
        var grid = new PointGrid(Alone);
        for (var i = 0; i < Alone; i++)
        {
            grid.Add(i, -i, 1);
        }

        Assert.False(grid.Binned);
        Assert.Equal(Enumerable.Range(0, Alone).Select(i => new GridPoint(i, -i, 1)), grid.Points);
    }

    /// <summary>Whatever cells are merged on the way: no observation is lost, and the cells' means have the mean of all.</summary>
    [Fact]
    public void CellsKeepCountAndMean() => Gen.Select(Gen.Double[-5, 5], Gen.Double[-1e6, 1e6]).Array[200, 600].Sample(places =>
    {
        var grid = new PointGrid(Alone);
        foreach (var (x, y) in places)
        {
            grid.Add(x * x * x, y, 2);
        }

        Assert.True(grid.Binned);
        Assert.InRange(grid.Points.Count, 1, MostCells);
        Assert.Equal(2.0 * places.Length, grid.Points.Sum(point => point.Count));
        Assert.Equal(places.Average(place => place.Item1 * place.Item1 * place.Item1), Mean(grid, point => point.X), 1e-9);
        Assert.Equal(places.Average(place => place.Item2), Mean(grid, point => point.Y), 1e-6);
        Assert.Equal(grid.Count, grid.Columns.Sum(column => column.Count));
        Assert.Equal(grid.Columns.OrderBy(column => column.X), grid.Columns);
    });

    /// <summary>A point far outside what came before has a cell of its own: an outlier is never averaged away.</summary>
    [Fact]
    public void AFarPointStandsAlone()
    {
        var grid = new PointGrid(Alone);
        for (var i = 0; i < 1000; i++)
        {
            grid.Add(i % 10, i % 7, 1);
        }

        grid.Add(-4000, 900, 1);
        Assert.Contains(new GridPoint(-4000, 900, 1), grid.Points);
    }

    [Fact]
    public void EqualPointsMakeOneCell()
    {
        var grid = new PointGrid(Alone);
        for (var i = 0; i < 1000; i++)
        {
            grid.Add(0, 3, 1);
        }

        Assert.Equal([new GridPoint(0, 3, 1000)], grid.Points);
    }

    private static double Mean(PointGrid grid, Func<GridPoint, double> value) => grid.Points.Sum(point => point.Count * value(point)) / grid.Count;
}
