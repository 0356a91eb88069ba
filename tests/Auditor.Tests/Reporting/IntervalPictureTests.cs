using System.Globalization;
using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Tests.Reporting;

public sealed class IntervalPictureTests
{
    [Fact]
    public void Only_groups_with_an_estimate_are_drawn()
    {
        IntervalPicture picture = IntervalPicture.Of(SampleExclusions.All)!;

        Assert.Equal(
            SampleExclusions.All.Select(exclusion => exclusion.PartialRSquared.Estimate is null ? null : exclusion.Group), picture.Rows.Select(row => row?.Name));
        Assert.Equal(5, picture.Rows.Count(row => row is not null));
    }

    [Fact]
    public void Nothing_to_draw_is_no_picture()
    {
        Assert.Null(IntervalPicture.Of([]));
        Assert.Null(IntervalPicture.Of([SampleExclusions.All[5]]));
    }

    [Fact]
    public void Places_follow_the_square_root()
    {
        IntervalPicture picture = IntervalPicture.Of([Sized(0.04, 0.01, 0.09)])!;
        double zero = Place(picture.Ticks.Single(tick => tick.Text == "0").At);
        double bound = Place(picture.Bound) - zero;
        PictureRow row = picture.Rows.Single()!;

        Assert.Equal(2, (Place(row.Estimate) - zero) / bound, 0.01);
        Assert.Equal(1, (Place(row.Basis!.From) - zero) / bound, 0.01);
        Assert.Equal(3, (Place(row.Basis.To) - zero) / bound, 0.01);
    }

    [Theory]
    [InlineData(0.02, 0.011, 0.05, "wholly above the bound")]
    [InlineData(0.002, 0, 0.009, "wholly below the bound")]
    [InlineData(0.02, 0.01, 0.05, "on both sides of the bound")]
    public void The_text_alternative_states_the_finding(double estimate, double lower, double upper, string place) =>
        Assert.EndsWith(place, IntervalPicture.Of([Sized(estimate, lower, upper)])!.Rows.Single()!.Finding, StringComparison.Ordinal);

    [Fact]
    public void Everything_lies_within_the_width_even_when_an_effect_is_everything()
    {
        IntervalPicture picture = IntervalPicture.Of([Sized(1, 0.9, 1), Sized(0.000001, 0, 0.0001)])!;

        Assert.All(
            picture.Rows.SelectMany(row => new[] { row!.Estimate, row.Basis!.From, row.Basis.To }).Concat(picture.Ticks.Select(tick => tick.At)),
            place => Assert.InRange(Place(place), 0, 100));
    }

    private static Exclusion Sized(double estimate, double lower, double upper) =>
        SampleExclusions.All[0] with { PartialRSquared = new(estimate, lower, upper, lower, upper, null) };

    private static double Place(string share) => double.Parse(share.TrimEnd('%'), CultureInfo.InvariantCulture);
}
