using Auditor.Facts;
using Auditor.Results;

namespace Auditor.Tests.Facts;

public sealed class ExclusionFactsTests
{
    private static readonly ExclusionInputs Nothing = new([], []);

    [Fact]
    public void Subject_and_line_are_those_of_the_group()
    {
        var facts = ExclusionFacts.From(Samples.Tested with { Line = 12 }, Nothing, Samples.Policy());

        Assert.Equal((About.Exclusion, "engine condition", (int?)12), (facts.About, facts.Subject, facts.Line));
    }

    [Theory]
    [InlineData("rows", 480L)]
    [InlineData("df1", 2L)]
    [InlineData("aliased_columns", 0L)]
    public void Counts(string name, long expected) => Assert.Equal(new FactValue.Count(expected), Of(Samples.Tested)[name]);

    [Theory]
    [InlineData("p", 0.03)]
    [InlineData("p_adjusted", 0.06)]
    [InlineData("classical_p", 0.0005)]
    [InlineData("partial_r_squared", 0.032)]
    [InlineData("partial_r_squared_lower", 0.008)]
    [InlineData("partial_r_squared_upper", 0.07)]
    [InlineData("effective_rows", 410.0)]
    [InlineData("negligible_p_adjusted", 0.95)]
    [InlineData("power_at_bound", 0.44)]
    [InlineData("rows_needed", 1100.0)]
    public void Numbers(string name, double expected) => Assert.Equal(new FactValue.Number(expected), Of(Samples.Tested)[name]);

    [Theory]
    [InlineData("group", "engine condition")]
    [InlineData("terms", "engine_hours, engine_hours^2")]
    [InlineData("basis", "hc3")]
    [InlineData("verdict", "inconclusive")]
    [InlineData("materiality", "not_shown")]
    public void Texts(string name, string expected) => Assert.Equal(new FactValue.Text(expected), Of(Samples.Tested)[name]);

    [Theory]
    [InlineData("rejects", true)]
    [InlineData("rejects_adjusted", false)]
    [InlineData("classical_disagrees", false)]
    [InlineData("other_row_set_verdict_differs", false)]
    [InlineData("has_aliased_columns", false)]
    [InlineData("holds_main_effect_of_product", false)]
    [InlineData("rests_on_one_row", false)]
    public void Flags(string name, bool expected) => Assert.Equal(new FactValue.Flag(expected), Of(Samples.Tested)[name]);

    [Theory]
    [InlineData(0.05, true)]
    [InlineData(0.0500001, false)]
    public void A_p_at_the_level_rejects(double p, bool rejects) =>
        Assert.Equal(new FactValue.Flag(rejects), Of(Samples.Tested with { P = p })["rejects"]);

    [Theory]
    [InlineData(0.051, 0.05, true)]
    [InlineData(0.05, 0.051, true)]
    [InlineData(0.05, 0.01, false)]
    [InlineData(0.2, 0.3, false)]
    public void Classical_and_basis_disagree_when_the_level_lies_between_them(double classical, double basis, bool disagree)
    {
        var exclusion = Samples.Tested with { P = basis, Tests = Samples.NoTests with { Classical = new TestFigures(1, 2, 470, classical) } };

        Assert.Equal(new FactValue.Flag(disagree), Of(exclusion)["classical_disagrees"]);
    }

    [Theory]
    [InlineData("p", "its columns equal those of the final model")]
    [InlineData("p_adjusted", "its columns equal those of the final model")]
    [InlineData("classical_p", "the group adds no rank")]
    [InlineData("classical_disagrees", "the group adds no rank")]
    [InlineData("partial_r_squared", "no rank, no effect")]
    [InlineData("selective_p", "no elimination rule declared")]
    [InlineData("other_p", "both row sets are the same")]
    [InlineData("digits_lost", "no column is nearly aliased")]
    [InlineData("because", "the declaration gives no reason")]
    public void What_the_record_shows_as_null_is_not_computable_with_the_records_reason(string name, string why) =>
        Assert.Equal(new FactValue.NotComputable(why), Of(Samples.Untestable)[name]);

    [Fact]
    public void A_reason_given_under_the_values_path_goes_before_the_groups_own()
    {
        var exclusion = Samples.Untestable with { Why = new Dictionary<string, string> { ["p_adjusted"] = "not in the family" } };

        Assert.Equal(new FactValue.NotComputable("not in the family"), Of(exclusion)["p_adjusted"]);
    }

    [Fact]
    public void The_other_row_set_is_compared_by_verdict()
    {
        var exclusion = Samples.Tested with { OtherRowSet = new OtherRowSetFigures(300, 9, 2, 290, 0.001, Verdicts.NotSupported) };

        Assert.Equal(new FactValue.Flag(true), Of(exclusion)["other_row_set_verdict_differs"]);
        Assert.Equal(new FactValue.Count(300), Of(exclusion)["other_rows"]);
    }

    [Fact]
    public void Lists_name_what_they_count()
    {
        var exclusion = Samples.Tested with
        {
            Aliased = [new AliasedColumn("grade = C", "region = south"), new AliasedColumn("b", "2 a")],
            NearlyAliased = [new NearlyAliasedColumn("x", 7.5), new NearlyAliasedColumn("z", 9)],
        };
        var facts = ExclusionFacts.From(exclusion, new ExclusionInputs(["a * b", "a * c"], [4, 1200]), Samples.Policy());

        Assert.Equal(new FactValue.Text("grade = C equals region = south; b equals 2 a"), facts["aliased"]);
        Assert.Equal(new FactValue.Text("x, z"), facts["nearly_aliased"]);
        Assert.Equal(new FactValue.Number(9), facts["digits_lost"]);
        Assert.Equal(new FactValue.Text("a * b, a * c"), facts["products_elsewhere"]);
        Assert.Equal(new FactValue.Text("4, 1200"), facts["own_rows"]);
        Assert.Equal(new FactValue.Flag(true), facts["rests_on_one_row"]);
    }

    private static FactSet Of(Exclusion exclusion) => ExclusionFacts.From(exclusion, Nothing, Samples.Policy());

    /// <summary>A ceiling of 0.012 and four groups: 0.048 after Holm's factor 4, 0.1 after Benjamini and Yekutieli's 4 (1 + 1/2 + 1/3 + 1/4), 0.012 without an adjustment.</summary>
    [Theory]
    [InlineData("holm", 4, false)]
    [InlineData("holm", 5, true)]
    [InlineData("hochberg", 5, true)]
    [InlineData("benjamini_hochberg", 4, false)]
    [InlineData("benjamini_yekutieli", 4, true)]
    [InlineData("benjamini_yekutieli", 2, false)]
    [InlineData("none", 40, false)]
    public void The_ceiling_after_adjustment_takes_the_policys_own_factor(string adjustment, int groups, bool cannot)
    {
        var exclusion = Samples.Tested with { Ceiling = new ScoreCeiling(0.012, false, null) };
        var facts = ExclusionFacts.From(exclusion, new ExclusionInputs([], []) { Groups = groups }, Samples.Policy("adjustment: " + adjustment));
        Assert.Equal(new FactValue.Flag(cannot), facts["cannot_reject_adjusted"]);
    }
}
