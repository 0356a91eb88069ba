using Auditor.Facts;
using Auditor.Results;

namespace Auditor.Tests.Facts;

public sealed class ModelFactsTests
{
    [Fact]
    public void The_joint_test_counts_the_groups_rejected_singly()
    {
        Exclusion[] groups = [Samples.Tested, Samples.Tested with { PAdjusted = 0.05 }, Samples.Untestable];
        var facts = AllLeftOutFacts.From(Samples.Tested with { Rows = 120 }, groups, 480, Samples.Policy());

        Assert.Equal(new FactValue.Count(1), facts["groups_rejected"]);
        Assert.Equal(new FactValue.Flag(true), facts["any_group_rejected"]);
        Assert.Equal(new FactValue.Count(1), facts["groups_untestable"]);
        Assert.Equal(new FactValue.Number(0.25), facts["rows_share"]);
        Assert.Equal(About.AllLeftOut, facts.About);
    }

    [Fact]
    public void The_joint_test_is_judged_at_the_policys_level()
    {
        var facts = AllLeftOutFacts.From(Samples.Tested, [Samples.Tested with { PAdjusted = 0.05 }], 480, Samples.Policy("significance: 0.01"));

        Assert.Equal(new FactValue.Flag(false), facts["any_group_rejected"]);
    }

    [Theory]
    [InlineData(474.0, false, false, false)]
    [InlineData(474.0, true, false, true)]
    [InlineData(0.0, true, true, false)]
    public void A_saturated_fit_is_not_called_perfect(double df, bool atRounding, bool saturated, bool perfect)
    {
        var facts = FitFacts.From("m", Samples.Fit with { DfResidual = df }, new FitInputs(atRounding, 1, Samples.Influence, Samples.Collinearity));

        Assert.Equal(new FactValue.Flag(saturated), facts["saturated"]);
        Assert.Equal(new FactValue.Flag(perfect), facts["perfect"]);
    }

    [Fact]
    public void A_fit_gives_rows_per_coefficient_and_its_reason_for_nulls()
    {
        var facts = FitFacts.From("m", Samples.Fit with { FP = null, Why = "only an intercept" }, new FitInputs(false, 0, Samples.Influence, Samples.Collinearity));

        Assert.Equal(new FactValue.Number(80), facts["rows_per_coefficient"]);
        Assert.Equal(new FactValue.NotComputable("only an intercept"), facts["f_p"]);
        Assert.Equal(new FactValue.Flag(false), facts["has_left_out_groups"]);
    }

    [Fact]
    public void Shares_of_rows_have_the_rows_before_them_as_their_whole()
    {
        var facts = RowFacts.From("m", Samples.Rows, Samples.Structure);

        Assert.Equal(new FactValue.Number(20.0 / 520), facts["filtered_out_share"]);
        Assert.Equal(new FactValue.Count(490), facts["kept"]);
        Assert.Equal(new FactValue.Number(7.0 / 490), facts["incomplete_share"]);
        Assert.Equal(new FactValue.Text("price (1,500), age (2)"), facts["missing_by_column"]);
        Assert.Equal(new FactValue.Flag(false), facts["nothing_lost"]);
    }

    [Fact]
    public void No_row_has_no_share()
    {
        var facts = RowFacts.From("m", new RowAccount(0, 0, 0, 0, 0, 0, new Dictionary<string, int>(), new Dictionary<string, int>(), []), new StructureCounts(0, null, null, null, null, null, null, null));

        Assert.Equal(new FactValue.NotComputable("there is no row to take a share of"), facts["incomplete_share"]);
    }

    [Fact]
    public void The_declared_structure_is_counted_and_what_is_not_declared_says_so()
    {
        var declared = RowFacts.From("m", Samples.Rows, Samples.Structure);
        Assert.Equal(new FactValue.Count(12), declared["n_clusters"]);
        Assert.Equal(new FactValue.Number(0.125), declared["largest_cluster_share"]);
        Assert.Equal(new FactValue.Flag(false), declared["every_cluster_has_one_row"]);
        Assert.Equal(new FactValue.Flag(true), declared["has_missing_periods"]);
        Assert.Equal(new FactValue.Flag(true), RowFacts.From("m", Samples.Rows, Samples.Structure with { OneRowClusters = 12 })["every_cluster_has_one_row"]);
        Assert.Equal(
            new FactValue.NotComputable("periods cannot be counted: dates without a declared period, or numbers that are not whole"),
            RowFacts.From("m", Samples.Rows, Samples.Structure with { MissingPeriods = null })["has_missing_periods"]);

        Assert.Equal(new FactValue.Flag(false), declared["days_as_periods"]);
        Assert.Equal(new FactValue.Flag(true), RowFacts.From("m", Samples.Rows, Samples.Structure with { DaysAsPeriods = true })["days_as_periods"]);

        var none = RowFacts.From("m", Samples.Rows, new StructureCounts(480, null, null, null, null, null, null, null));
        Assert.Equal(new FactValue.Flag(false), none["clusters_declared"]);
        Assert.Equal(new FactValue.NotComputable("no cluster declared"), none["n_clusters"]);
        Assert.Equal(new FactValue.NotComputable("no time order declared"), none["missing_periods"]);
        Assert.Equal(new FactValue.NotComputable("no time order declared"), none["days_as_periods"]);
    }

    [Fact]
    public void A_check_without_p_has_no_rejection_either()
    {
        var facts = CheckFacts.From(new CheckResult("ljung_box_4", null, null, null, null, "independence", null, "no time order declared"));

        Assert.Equal("ljung_box_4", facts.Subject);
        Assert.Equal(new FactValue.NotComputable("no time order declared"), facts["rejects"]);
    }

    [Theory]
    [InlineData(-1.0, 2.0, true)]
    [InlineData(0.0, 2.0, true)]
    [InlineData(0.1, 2.0, false)]
    public void An_interval_holds_zero_with_its_limits(double lower, double upper, bool holds)
    {
        var facts = CoefficientFacts.From(new CoefficientFigures("price", 1, 1, 1, 0.3, null, lower, upper, null));

        Assert.Equal(new FactValue.Flag(holds), facts["interval_holds_zero"]);
    }
}
