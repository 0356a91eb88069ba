using System.Globalization;
using Auditor.Reporting.Html;

namespace Auditor.Tests.Reporting;

public sealed class PictureAxisTests
{
    [Theory]
    [InlineData(-70, 68, "−60 −40 −20 0 20 40 60")]
    [InlineData(0, 0.0102, "0 0.002 0.004 0.006 0.008 0.010")]
    [InlineData(0.31, 0.33, "0.310 0.315 0.320 0.325 0.330")]
    [InlineData(1_000_000, 3_000_000, "1,000,000 1,500,000 2,000,000 2,500,000 3,000,000")]
    [InlineData(-3e-7, 3e-7, "−3 × 10⁻⁷ −2 × 10⁻⁷ −1 × 10⁻⁷ 0 1 × 10⁻⁷ 2 × 10⁻⁷ 3 × 10⁻⁷")]
    [InlineData(2e12, 4e12, "2.0 × 10¹² 2.5 × 10¹² 3.0 × 10¹² 3.5 × 10¹² 4.0 × 10¹²")]
    public void Ticks_are_round_and_no_longer_than_needed(double low, double high, string ticks) =>
        Assert.Equal(ticks, string.Join(' ', PictureAxis.Covering([low, high], 0, 100).Ticks(8).Select(tick => tick.Text)).Replace('\u00A0', ' '));

    [Theory]
    [InlineData(5, 5)]
    [InlineData(0, 0)]
    [InlineData(1e9, 1e9)]
    [InlineData(-1e-300, 1e-300)]
    [InlineData(-1e150, 1e150)]
    public void Any_range_has_a_few_ticks_within_the_picture(double low, double high)
    {
        var ticks = PictureAxis.Covering([low, high], 0, 100).Ticks(8);
        Assert.InRange(ticks.Count, 2, 9);
        Assert.All(ticks, tick => Assert.InRange(double.Parse(tick.At, CultureInfo.InvariantCulture), 0, 100));
        Assert.Distinct(ticks.Select(tick => tick.Text));
    }

    [Fact]
    public void An_axis_may_run_upwards()
    {
        var axis = PictureAxis.Covering([0, 10], 200, 100);
        Assert.Equal(150, axis.At(5), 1e-9);
        Assert.True(axis.At(10) < axis.At(0));
        Assert.InRange(axis.At(10), 100, 105);
    }
}
