using System.Net;
using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Tests.Reporting;

/// <summary>What a page says of a group, and of its parts, when the test cannot reject.</summary>
public sealed class ShownExclusionTests
{
    private const double Level = 0.05;

    private static Exclusion Engine => SampleExclusions.All[0];

    /// <summary>As the formulas yield it where the ceiling of the score form lies above the level: an interval of no width at zero.</summary>
    private static Exclusion Untestable => Engine with
    {
        Verdict = Verdicts.Untestable,
        Materiality = Materialities.ShownNegligible,
        PartialRSquared = Engine.PartialRSquared with { BasisLower = 0, BasisUpper = 0 },
        Negligible = new(0.01, 1e-9, 1e-8, null),
    };

    [Fact]
    public void An_untestable_group_has_no_interval_by_the_test_that_cannot_reject()
    {
        string page = Page(Untestable);

        Assert.Contains("none: the test cannot reject here", page, StringComparison.Ordinal);
        Assert.DoesNotContain(">0 to 0<", page, StringComparison.Ordinal);
        Assert.DoesNotContain("Shown to be negligible", page, StringComparison.Ordinal);
        Assert.DoesNotContain("<dt>Independent rows these are worth</dt>", page, StringComparison.Ordinal);
    }

    [Fact]
    public void Nor_is_one_drawn()
    {
        var row = Assert.Single(IntervalPicture.Of([Untestable])!.Rows)!;

        Assert.Null(row.Basis);
        Assert.NotNull(row.Classical);
        Assert.Contains("the test cannot reject here", row.Finding, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_other_group_is_shown_as_it_is() => Assert.Same(Engine, ShownExclusion.Of(Engine));

    [Theory]
    [InlineData(0.768, "No difference shown")]
    [InlineData(0.0124, "The effect is not the same in all parts")]
    public void A_difference_between_parts_has_its_outcome_at_the_level(double adjusted, string outcome)
    {
        var division = Engine.InParts[1];
        var parts = PartsPage.Of(Engine with { InParts = [division with { Difference = division.Difference with { PAdjusted = adjusted } }] }, Level);

        Assert.Equal(outcome, Assert.Single(parts).Difference.Present[0].Cell.Text);
    }

    [Fact]
    public void A_part_has_its_statistic_and_the_caption_the_name_of_the_test()
    {
        var table = PartsPage.Of(Engine, Level)[1].Table;

        Assert.Equal("By region <i>: Robust F (HC3)", table.Caption);
        Assert.Equal("F\u00A0=\u00A08.020 on\u00A02 and\u00A01,190", table.Rows[0][2].Text);
    }

    [Fact]
    public void A_part_whose_test_cannot_reject_has_no_interval()
    {
        var division = Engine.InParts[1];
        var blunt = division.Parts[0] with { Test = division.Parts[0].Test! with { CeilingP = 0.2 } };

        var strip = Assert.Single(PartsPage.Of(Engine with { InParts = [division with { Parts = [blunt] }] }, Level)).Strips[0];

        Assert.Null(strip!.Basis);
    }

    [Theory]
    [InlineData(2391, null)]
    [InlineData(2392, "1 row without a value of region <i> is in no part.")]
    [InlineData(2398, "7 rows without a value of region <i> are in no part.")]
    public void Rows_in_no_part_are_counted(int rows, string? said) =>
        Assert.Equal(said, PartsPage.Of(Engine with { Rows = rows }, Level)[1].Outside);

    [Fact]
    public void All_divisions_of_a_group_are_drawn_on_one_axis() => Assert.Single(PartsPage.Of(Engine, Level).Select(part => part.End).Distinct());

    [Theory]
    [InlineData("cluster", true)]
    [InlineData("time", false)]
    public void Worth_of_clusters_stands_only_under_a_test_over_clusters(string basis, bool shown) =>
        Assert.Equal(shown, Page(Engine with { Basis = basis, BasisSums = 40, EffectiveClusters = 12.5 }).Contains("Clusters these are worth", StringComparison.Ordinal));

    [Theory]
    [InlineData(null, false)]
    [InlineData(40, true)]
    public void Checks_that_need_independence_say_so_where_dependence_is_declared(int? clusters, bool said)
    {
        var record = SampleRecords.Full with { Structure = new(2431, clusters, null, null, null, null, null, null) };

        Assert.Equal(said, Pages.Render(record).Contains("the rows as independent: where", StringComparison.Ordinal));
    }

    [Fact]
    public void A_recomputed_figure_has_four_digits_beside_the_rounded_one()
    {
        var record = SampleRecords.Full with { Claims = [new("reported.sigma", "Residual standard deviation", "0.2", 0.12437, ClaimOutcomes.Differs) { RecomputedAsPrinted = "0.1" }] };

        Assert.Equal(["0.2", "0.1244", "0.1"], ClaimWords.Table(record, []).Rows[0].Skip(1).Take(3).Select(cell => cell.Text));
    }

    [Theory]
    [InlineData("own", "On the rows complete for every group")]
    [InlineData("common", "On the rows complete for the group alone")]
    public void The_other_rows_are_named(string set, string heading)
    {
        var policy = new Dictionary<string, object>(SampleRecords.Full.Policy) { ["row_set"] = set };

        Assert.Contains($"<h4>{heading}</h4>", Pages.Render(SampleRecords.Full with { Policy = policy }), StringComparison.Ordinal);
    }

    private static string Page(Exclusion exclusion) => WebUtility.HtmlDecode(Pages.Render(SampleRecords.Full with { Exclusions = [exclusion], AllLeftOut = null }));
}
