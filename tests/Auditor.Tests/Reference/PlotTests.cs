using System.Text;
using Auditor.Reporting;
using Auditor.Results;
using Auditor.Tests.Reporting;

namespace Auditor.Tests.Reference;

/// <summary>Points of the residual pictures, and the size of a page that holds them.</summary>
public sealed class PlotTests
{
    private const int LargestPage = 1_500_000;

    /// <summary>Source: R 4.2, lm(stack_loss ~ air_flow + water_temp) with fitted, resid, rstandard, rstudent, hatvalues, cooks.distance.</summary>
    [Fact]
    public void Points_are_those_of_R()
    {
        var plots = Of("stack_loss").Plots!.Plots!;

        AssertPoint(38.3080021356922, 3.69199786430777, plots.Fitted.Points[0]);
        AssertPoint(22.5289981502337, -7.5289981502337, plots.Fitted.Points[20]);
        AssertPoint(22.5289981502337, 1.86299006907207, plots.Scale.Points[20]);
        AssertPoint(0.280564908124382, 1.37707925189909, plots.Leverage.Points[0]);
        AssertPoint(0.276019267912682, -3.47073199746116, plots.Leverage.Points[20]);
        Assert.Equal([21, 1, 3], plots.Named.Select(named => named.Row));
        Assert.Equal(0.948680029351842, plots.Named[0].CooksDistance, 1e-10);
        Assert.Equal(0, plots.AboveHighLeverage);
        Assert.Equal(6 / 21.0, plots.HighLeverage, 1e-12);
    }

    /// <summary>Source: as above; the envelope by qnorm(qbeta(p, i, n + 1 - i)).</summary>
    [Fact]
    public void Normal_quantiles_are_those_of_R()
    {
        var normal = Of("stack_loss").Plots!.Plots!.Normal;

        Assert.Equal(21, normal.Points.Count);
        Assert.Equal(-2.73221147350736, normal.Points[0].Residual, 1e-10);
        Assert.Equal(1.87153138455178, normal.Points[^1].Residual, 1e-10);
        Assert.Equal(-3.03444750393641, normal.Points[0].Lower, 1e-10);
        Assert.Equal(-1.84569541763756, normal.Points[0].Z, 1e-10);
        Assert.Equal(3.0344475039364, normal.Points[^1].Upper, 1e-10);
        Assert.Equal(0, normal.Outside);
    }

    [Fact]
    public void A_page_on_fifty_thousand_rows_stays_small()
    {
        var record = Of("diamonds");
        var plots = record.Plots!.Plots!;
        string page = Pages.Render(record);

        Assert.Equal(53_940, plots.Fitted.Rows);
        Assert.Equal(53_940, plots.Fitted.Points.Sum(point => point.Count));
        Assert.All(new[] { plots.Fitted, plots.Scale, plots.Leverage }, cloud => Assert.InRange(cloud.Points.Count, 100, 1500));
        Assert.Equal(1500, plots.Normal.Points.Count);
        Assert.True(plots.Normal.Points.Zip(plots.Normal.Points.Skip(1)).All(pair => pair.First.Z < pair.Second.Z));
        Assert.InRange(Encoding.UTF8.GetByteCount(page), 50_000, LargestPage);
        Assert.Equal(page, Cultures.In("de-DE", () => Pages.Render(record)));
    }

    private static AuditRecord Of(string name) =>
        AuditRunner.Record(ReferenceFiles.FullPath($"{name}/declaration.yaml"), ReferenceFiles.ReadText("policy-reference.yaml"));

    private static void AssertPoint(double x, double y, PlotPoint point)
    {
        Assert.Equal(x, point.X, 1e-9);
        Assert.Equal(y, point.Y, 1e-9);
    }
}
