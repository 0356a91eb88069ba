using System.Globalization;
using System.Net;
using System.Text.RegularExpressions;
using Auditor.Reporting;
using Auditor.Reporting.Html;

namespace Auditor.Tests.Reporting;

public sealed partial class ResidualPicturesTests
{
    private const double Level = 0.05;

    [Fact]
    public void Titles_say_what_the_checks_say() => Assert.Equal(
        [
            "No check speaks against the form",
            "Normal errors are contradicted",
            "The spread of the residuals is not equal",
            "7 of 60 rows have more than twice the mean leverage",
        ],
        Pictures(SampleRecords.Full).Select(picture => picture.Title));

    [Fact]
    public void Every_picture_has_its_finding_as_text_for_who_cannot_see_it()
    {
        string page = WebUtility.HtmlDecode(Pages.Render(SampleRecords.Full));
        Assert.All(Pictures(SampleRecords.Full), picture =>
        {
            Assert.Contains($"aria-labelledby=\"{picture.Anchor}-title {picture.Anchor}-text\"", page, StringComparison.Ordinal);
            Assert.Contains($"<title id=\"{picture.Anchor}-title\">{picture.Name}: {picture.Title}</title>", page, StringComparison.Ordinal);
            Assert.Contains($"<desc id=\"{picture.Anchor}-text\">{picture.Finding} Across: {picture.Across}. Up: {picture.Up}.</desc>", page, StringComparison.Ordinal);
            Assert.Matches("p\u00A0[=<>]", picture.Finding);
        });
        Assert.Contains("White: p\u00A0=\u00A00.000371", Pictures(SampleRecords.Full)[2].Finding, StringComparison.Ordinal);
        Assert.Contains("2 of 60 points lie outside the envelope", Pictures(SampleRecords.Full)[1].Finding, StringComparison.Ordinal);
        Assert.StartsWith("L-20418 has the largest Cook’s distance, 0.0681,", Pictures(SampleRecords.Full)[3].Finding, StringComparison.Ordinal);
    }

    [Fact]
    public void A_form_that_needs_normal_errors_does_not_make_the_title_alone()
    {
        var checks = SampleChecks.All.Select(check => check.Check is "breusch_pagan" or "white" ? check with { P = 0.4, Rejects = false } : check);
        var record = SampleRecords.Full with { Checks = [.. checks] };
        Assert.Equal("No check speaks against an equal spread", Pictures(record)[2].Title);
        Assert.StartsWith("Only the original form", CheckConsequence.Of(record)[0].Follows, StringComparison.Ordinal);
    }

    [Fact]
    public void Checks_that_could_not_be_made_are_no_finding()
    {
        var record = SampleRecords.Full with { Checks = [.. SampleChecks.All.Select(check => check with { P = null, Rejects = null, Why = "sampling weights" })] };
        Assert.Equal("Whether the spread is equal was not checked", Pictures(record)[2].Title);
        Assert.Equal("Not checked: sampling weights.", Pictures(record)[2].Finding);
        Assert.Empty(CheckConsequence.Of(record));
    }

    [Fact]
    public void Every_contradicted_assumption_has_its_consequence()
    {
        var consequences = CheckConsequence.Of(SampleRecords.Full);
        Assert.Equal(["equal variance", "normality", "no outlier"], consequences.Select(item => item.Assumption));
        Assert.All(consequences, item => Assert.Contains(WebUtility.HtmlEncode(item.Follows), Pages.Render(SampleRecords.Full), StringComparison.Ordinal));
        Assert.Contains("Robust F (HC3), which does not need an equal spread", consequences[0].Follows, StringComparison.Ordinal);
    }

    [Fact]
    public void A_verdict_on_the_classical_test_is_named_when_the_spread_is_unequal()
    {
        var record = SampleRecords.Full with { Exclusions = [SampleExclusions.All[0] with { Basis = "classical" }, SampleExclusions.All[1] with { Basis = "hc3" }] };
        Assert.StartsWith($"The verdict on {record.Exclusions[0].Group} rests on the classical test", CheckConsequence.Of(record)[0].Follows, StringComparison.Ordinal);
        Assert.Contains("The other verdicts rest on Robust F (HC3)", CheckConsequence.Of(record)[0].Follows, StringComparison.Ordinal);
    }

    [Fact]
    public void Nothing_to_draw_is_said_with_its_reason()
    {
        string page = Pages.Render(SampleRecords.Full with { Plots = new(null, "the fit is perfect") });
        Assert.Contains("Not drawn: the fit is perfect.", page, StringComparison.Ordinal);
        Assert.DoesNotContain("class=\"residuals\"", page, StringComparison.Ordinal);
    }

    [Fact]
    public void All_dots_lie_within_the_ruled_part_in_one_path_a_size()
    {
        foreach (var picture in Pictures(SampleRecords.Full))
        {
            var dots = picture.Paths.Where(path => path.Kind.StartsWith("dot", StringComparison.Ordinal)).ToList();
            Assert.Distinct(dots.Select(path => path.Kind));
            var places = dots.SelectMany(path => Place().Matches(path.D)).ToList();
            Assert.True(places.Count > 40);
            Assert.All(places, place => Assert.InRange(Number(place.Groups[1]), Picture.Left, Picture.Right));
            Assert.All(places, place => Assert.InRange(Number(place.Groups[2]), Picture.Top, Picture.Bottom));
        }

        Assert.Equal(["dot most", "dot one"], Pictures(SampleRecords.Full)[2].Paths.Select(path => path.Kind));
    }

    [Fact]
    public void Names_of_near_points_do_not_cover_each_other()
    {
        var labels = Pictures(SampleRecords.Full)[3].Labels;
        Assert.Equal(["L-20418", "row 1,980", "a label of ma…"], labels.Select(label => label.Text));
        double[] heights = [.. labels.Select(label => double.Parse(label.Y, CultureInfo.InvariantCulture)).Order()];
        Assert.All(heights.Zip(heights.Skip(1)), pair => Assert.True(pair.Second - pair.First >= 12.9));
    }

    [Fact]
    public void The_record_does_not_carry_the_points() =>
        Assert.Equal(JsonRecord.Write(SampleRecords.Full with { Plots = null }), JsonRecord.Write(SampleRecords.Full));

    private static IReadOnlyList<Picture> Pictures(AuditRecord record) => ResidualPictures.Of(record, Level);

    private static double Number(Group group) => double.Parse(group.Value, CultureInfo.InvariantCulture);

    [GeneratedRegex(@"M([\d.]+) ([\d.]+)h0")]
    private static partial Regex Place();
}
