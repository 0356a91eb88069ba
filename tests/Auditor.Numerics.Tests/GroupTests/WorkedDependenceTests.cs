using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>The worked cases of tests/vectors over clusters and periods: 24 rows, 8 clusters, 24 periods or 8 periods of 3 rows.</summary>
public sealed class WorkedDependenceTests
{
    private static readonly VectorFile Scores = new("score_forms");
    private static readonly VectorFile Effective = new("effective_rows");

    [Theory]
    [InlineData("z1", 0)]
    [InlineData("z2", 1)]
    [InlineData("z1+z2", 2)]
    public void Score_form_over_clusters(string name, int group)
    {
        var analysis = Analyse();
        var (added, sums) = (Added(analysis, group), analysis.Sums(group).Cluster!);
        var score = Assert.IsType<FTest>(ClusterF.Of(added, sums));

        Assert.Equal(8, sums.Contributing);
        VectorFile.Near(Scores.Output("cluster", name, "phi"), ClusterF.Phi(added, sums));
        VectorFile.Near(Scores.Output("cluster", name, "f_with_phi"), score.Statistic);
        VectorFile.Near(Scores.Output("cluster", name, "p_with_phi"), score.P);
        Assert.Equal((Scores.Output("cluster", name, "df1"), Scores.Output("cluster", name, "df2")), (score.Df1, score.Df2));
    }

    [Theory]
    [InlineData("z1", 0)]
    [InlineData("z2", 1)]
    [InlineData("z1+z2", 2)]
    public void Score_form_over_periods(string name, int group)
    {
        var analysis = Analyse();
        var (added, sums) = (Added(analysis, group), analysis.Sums(group).Period!);
        var score = Assert.IsType<FTest>(PeriodF.Of(added, sums));

        Assert.Equal(Scores.Output("time", name, "nu"), PeriodF.CosineCount(sums.Count));
        VectorFile.Near(Scores.Output("time", name, "phi"), ClusterF.Phi(added, sums));
        VectorFile.Near(Scores.Output("time", name, "f_with_phi"), score.Statistic);
        VectorFile.Near(Scores.Output("time", name, "p_with_phi"), score.P);
        Assert.Equal((Scores.Output("time", name, "df1"), Scores.Output("time", name, "df2")), (score.Df1, score.Df2));
    }

    /// <summary>The file's ceilings are without phi; the tool's own carry it as their forms do.</summary>
    [Fact]
    public void Ceilings()
    {
        var analysis = Analyse();
        var (added, cluster, period) = (Added(analysis, 2), analysis.Sums(2).Cluster!, analysis.Sums(2).Period!);
        var lm = ClusterF.Phi(added, cluster) * Scores.Output("ceiling_in_observed_direction", "cluster", "lm");
        VectorFile.Near(3 * lm / (8 - lm), Statistic(ClusterF.Ceiling(added, cluster)));
        VectorFile.Near(
            ClusterF.Phi(added, period) * Scores.Output("ceiling_in_observed_direction", "time", "f"), Statistic(PeriodF.Ceiling(added, period)));
    }

    [Fact]
    public void Several_rows_a_period_are_summed_and_too_few_periods_are_untestable()
    {
        var analysis = Analyse("period_panel");
        Assert.Equal(1, PeriodF.CosineCount(8));
        Assert.Equal(Impediment.TooFewPeriods, Assert.IsType<NotComputable>(PeriodF.Of(Added(analysis, 2), analysis.Sums(2).Period!)).Why);
        var (z1, sums) = (Added(analysis, 0), analysis.Sums(0).Period!);
        VectorFile.Near(
            ClusterF.Phi(z1, sums) * Scores.Output("time_panel_period_sums_T8", "z1", "f"), Statistic(PeriodF.Of(z1, sums)));
    }

    [Fact]
    public void Cr1_and_Cr2()
    {
        var analysis = Analyse();
        var (added, sums) = (Added(analysis, 2), analysis.Sums(2).Cluster!);
        Compare("cr1", Cr1.Of(added, sums));
        var both = Cr2.Of(added, sums);
        VectorFile.Near(Scores.Output("cr2_aht", "eta"), both.Eta);
        Compare("cr2_aht", both.Test);
        var one = Cr2.Of(Added(analysis, 0), analysis.Sums(0).Cluster!);
        Compare("cr2_aht_z1_alone_added", one.Test);
    }

    [Fact]
    public void Effective_rows_interval_and_negligible_effect_CR2()
    {
        var analysis = Analyse();
        var estimate = Cr2.Of(Added(analysis, 2), analysis.Sums(2).Cluster!);
        CompareEffective("cr2", analysis, estimate.Covariance!, estimate.Test);
    }

    /// <summary>The file's covariance is not divided by its bias factor k; that is held against n x n matrices in BruteForceTests.</summary>
    [Fact]
    public void Effective_rows_interval_and_negligible_effect_of_the_time_form()
    {
        var analysis = Analyse();
        var estimate = PeriodWald.Of(Added(analysis, 2), analysis.Sums(2).Period!);
        var test = Assert.IsType<FTest>(estimate.Test);
        var (v, k) = (estimate.Covariance!, estimate.BiasFactor!.Value);
        double[,] raw = { { v[0, 0] * k, v[0, 1] * k }, { v[1, 0] * k, v[1, 1] * k } };
        CompareEffective(
            "cosine_on_residuals_of_larger_model", analysis, raw, TestResult.F(test.Statistic / k, test.Df1, test.Df2));
    }

    private static void Compare(string name, TestResult result)
    {
        var test = Assert.IsType<FTest>(result);
        VectorFile.Near(Scores.Output(name, "f"), test.Statistic);
        VectorFile.Near(Scores.Output(name, "df2"), test.Df2);
        VectorFile.Near(Scores.Output(name, "p"), test.P);
    }

    private static void CompareEffective(string name, GroupAnalysis analysis, double[,] covariance, TestResult result)
    {
        var (group, test) = (Added(analysis, 2), Assert.IsType<FTest>(result));
        var df2 = PartialF.ResidualDf(group);
        var rows = EffectiveRows.Of(covariance, group.RssWith / df2, group.Rank, df2)!;
        VectorFile.Near(Effective.Output(name, "wald_f"), test.Statistic);
        VectorFile.Near(Effective.Output(name, "df2"), test.Df2);
        VectorFile.Near(Effective.Output(name, "n_eff"), rows.LeastInformed);
        VectorFile.Near(Effective.Output(name, "n_eff_largest_direction"), rows.BestInformed);
        VectorFile.Near(Effective.Output(name, "negligible_p"), NegligibleEffect.P(test, rows, Effective.Output(name, "bound")));
        var interval = EffectInterval.Of(test, rows, 0.05);
        VectorFile.Near(Effective.Output(name, "partial_r2_lower_consistent"), interval?.Lower);
        VectorFile.Near(Effective.Output(name, "partial_r2_upper_consistent"), interval?.Upper);
    }

    private static Auditor.Numerics.Factor.AddedGroup Added(GroupAnalysis analysis, int group) => group == 2 ? analysis.All : analysis.Groups[group];

    private static GroupAnalysis Analyse(string period = "period_in_row_order")
    {
        var design = new MatrixDesign(
            true,
            [Scores.Input("final_columns", "x")],
            [[Scores.Input("group_columns", "z1")], [Scores.Input("group_columns", "z2")]],
            Scores.Input("y"));
        return new GroupAnalysis(design, new DependenceStructure { Cluster = Classes("cluster"), Period = Classes(period) });
    }

    private static RowClasses Classes(string name) => RowClasses.Ranked([.. Scores.Input(name).Select(value => (int)value)]);

    private static double Statistic(TestResult result) => Assert.IsType<FTest>(result).Statistic;
}
