using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>The worked cases of tests/vectors, 24 rows, group of two columns.</summary>
public sealed class WorkedCaseTests
{
    [Fact]
    public void Added_block_gives_partial_F_and_HC_Wald_F()
    {
        var file = new VectorFile("added_block");
        var analysis = Analyse(file, file.Input("y"));
        var group = analysis.Groups[0];

        VectorFile.Near(file.Output("rss_final"), analysis.Final.Rss);
        VectorFile.Near(file.Output("rss_with_group"), group.RssWith);
        VectorFile.Near(file.Output("group_sum_of_squares"), group.SumOfSquares);
        var partial = Assert.IsType<FTest>(PartialF.Of(group));
        VectorFile.Near(file.Output("partial_f"), partial.Statistic);
        VectorFile.Near(file.Output("partial_f_p"), partial.P);
        Assert.Equal((2, 20), (partial.Df1, partial.Df2));
        foreach (var estimator in Enum.GetValues<Heteroskedastic>())
        {
            var wald = Assert.IsType<FTest>(WaldF.Of(group, analysis.Sums(0), estimator));
            VectorFile.Near(file.Output($"wald_f_{estimator}".ToLowerInvariant()), wald.Statistic);
        }

        VectorFile.Near(file.Output("wald_f_hc3_p"), WaldF.Of(group, analysis.Sums(0), Heteroskedastic.Hc3).P);
    }

    [Fact]
    public void A_row_with_its_own_dummy_in_the_final_model_does_not_disturb_other_groups()
    {
        var file = new VectorFile("leverage_one");
        var dummy = new double[24];
        dummy[file.Inputs.GetProperty("dummy_row").GetInt32() - 1] = 1;
        var analysis = Analyse(file, file.Input("y"), dummy);
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0));

        Assert.Equal([4], sums.LeverageOneInFinal);
        VectorFile.Near(file.Output("wald_f_hc3_with_dummy"), Statistic(WaldF.Of(group, sums, Heteroskedastic.Hc3)));
        VectorFile.Near(file.Output("partial_f"), Statistic(PartialF.Of(group)));
        Assert.Equal(23, sums.ContributingN);
        VectorFile.Near(file.Output("score_f_using_n_23"), PlainScoreF(group.U, sums.Score, 23));
    }

    [Theory]
    [InlineData("z1", 0)]
    [InlineData("z2", 1)]
    [InlineData("z1+z2", 2)]
    public void Score_form_over_rows(string name, int group)
    {
        var file = new VectorFile("score_forms");
        var design = Design(file, file.Input("y"), [], [[file.Input("group_columns", "z1")], [file.Input("group_columns", "z2")]]);
        var analysis = new GroupAnalysis(design);
        var added = group == 2 ? analysis.All : analysis.Groups[group];
        var score = Assert.IsType<FTest>(ScoreF.Of(added, analysis.Sums(group)));

        VectorFile.Near(file.Output("rows", name, "phi"), ScoreF.Phi(added, analysis.Sums(group)));
        VectorFile.Near(file.Output("rows", name, "f"), PlainScoreF(added.U, analysis.Sums(group).Score, 24));
        VectorFile.Near(file.Output("rows", name, "f_with_phi"), score.Statistic);
        VectorFile.Near(file.Output("rows", name, "p_with_phi"), score.P);
    }

    [Fact]
    public void Ceiling_of_the_score_form_over_rows()
    {
        var file = new VectorFile("score_forms");
        var analysis = Analyse(file, file.Input("y"));
        var sums = analysis.Sums(0);

        // The worked case gives the plain form; the tool's own carries phi as its score form does.
        VectorFile.Near(file.Output("ceiling_in_observed_direction", "rows", "lm"), Quadratic.Form(analysis.Groups[0].U, sums.Ceiling));
        var phi = ScoreF.Phi(analysis.Groups[0], sums);
        var lm = phi * file.Output("ceiling_in_observed_direction", "rows", "lm");
        VectorFile.Near(11 * lm / (24 - lm), Statistic(ScoreF.Ceiling(analysis.Groups[0], sums)));
    }

    [Fact]
    public void Effective_rows_interval_and_negligible_effect_classical()
    {
        var file = new VectorFile("effective_rows");
        var analysis = Analyse(file, file.Input("y"));
        var test = Assert.IsType<FTest>(PartialF.Of(analysis.Groups[0]));
        Compare(file, "classical", test, EffectiveRows.Classical(test.Df1, test.Df2));
    }

    [Theory]
    [InlineData("hc3", 0, false)]
    [InlineData("hc3_with_y_plus_1.5_z1", 1.5, false)]
    [InlineData("hc3_z1_alone", 0, true)]
    public void Effective_rows_interval_and_negligible_effect_HC3(string name, double shift, bool alone)
    {
        var file = new VectorFile("effective_rows");
        var z1 = file.Input("group_columns", "z1");
        // The file's numbers carry four decimals, the shifted response too.
        var y = file.Input("y").Zip(z1, (value, z) => Math.Round(value + (shift * z), 4)).ToArray();
        var groups = alone ? new[] { z1 } : [z1, file.Input("group_columns", "z2")];
        CompareHc3(file, name, new GroupAnalysis(Design(file, y, [], [groups])));
    }

    [Theory]
    [InlineData("weighted_hc3_weights_times_1", 1)]
    [InlineData("weighted_hc3_weights_times_10", 10)]
    public void Effective_rows_do_not_depend_on_the_scale_of_the_weights(string name, double scale)
    {
        var file = new VectorFile("effective_rows");
        var weights = file.Input("weights").Select(weight => weight * scale).ToArray();
        double[][] group = [file.Input("group_columns", "z1"), file.Input("group_columns", "z2")];
        var design = new MatrixDesign(true, [file.Input("final_columns", "x")], [group], file.Input("y"), weights);
        CompareHc3(file, name, new GroupAnalysis(design));
    }

    private static void CompareHc3(VectorFile file, string name, GroupAnalysis analysis)
    {
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0));
        var wald = Assert.IsType<FTest>(WaldF.Of(group, sums, Heteroskedastic.Hc3));
        var meanSquare = group.RssWith / PartialF.ResidualDf(group);
        var rows = EffectiveRows.Of(sums.Hc3, meanSquare, group.Rank, PartialF.ResidualDf(group));
        Compare(file, name, wald, rows!);
    }

    private static void Compare(VectorFile file, string name, FTest test, EffectiveRows rows)
    {
        VectorFile.Near(file.Output(name, "wald_f"), test.Statistic);
        VectorFile.Near(file.Output(name, "n_eff"), rows.LeastInformed);
        VectorFile.Near(file.Output(name, "n_eff_largest_direction"), rows.BestInformed);
        VectorFile.Near(file.Output(name, "negligible_p"), NegligibleEffect.P(test, rows, file.Output(name, "bound")));
        var interval = EffectInterval.Of(test, rows, 0.05);
        VectorFile.Near(file.Output(name, "partial_r2_lower_consistent"), interval?.Lower);
        VectorFile.Near(file.Output(name, "partial_r2_upper_consistent"), interval?.Upper);
    }

    private static GroupAnalysis Analyse(VectorFile file, double[] y, params double[][] furtherFinal) =>
        new(Design(file, y, furtherFinal, [[file.Input("group_columns", "z1"), file.Input("group_columns", "z2")]]));

    private static MatrixDesign Design(VectorFile file, double[] y, double[][] furtherFinal, double[][][] groups) =>
        new(true, [file.Input("final_columns", "x"), .. furtherFinal], groups, y);

    private static double Statistic(TestResult result) => Assert.IsType<FTest>(result).Statistic;

    private static double PlainScoreF(IReadOnlyList<double> u, double[,] m, double n)
    {
        var lm = Quadratic.Form(u, m)!.Value;
        return (n - u.Count) / u.Count * lm / (n - lm);
    }
}
