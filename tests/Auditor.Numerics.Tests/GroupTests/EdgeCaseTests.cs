using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>Every edge of the method: what has no value says why, what has one keeps it. Expected values follow from the definitions (no source).</summary>
public sealed class EdgeCaseTests
{
    private static readonly double[] X = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10];
    private static readonly double[] Z = [2, -1, 0.5, 3, -2, 1, 0, 4, -3, 1.5];
    private static readonly double[] Noise = [0.3, -0.2, 0.5, -0.4, 0.1, -0.6, 0.2, 0.4, -0.1, -0.2];

    [Fact]
    public void A_perfect_fit_with_the_group_gives_p_zero_and_no_F()
    {
        var analysis = Analyse([X], [Z], [.. X.Zip(Z, (x, z) => 3 + (2 * x) + (0.1 * z))]);
        var result = Assert.IsType<PerfectWithGroup>(PartialF.Of(analysis.Groups[0]));
        Assert.Equal((1, 7, 0), (result.Df1, result.Df2, result.P));
        Why(Impediment.PerfectWithGroup, WaldF.Of(analysis.Groups[0], analysis.Sums(0), Heteroskedastic.Hc3));
        Why(Impediment.PerfectWithGroup, ScoreF.Of(analysis.Groups[0], analysis.Sums(0)));
    }

    [Fact]
    public void A_final_model_that_already_fits_perfectly_leaves_nothing_to_test()
    {
        var analysis = Analyse([X], [Z], [.. X.Select(x => 3 + (0.7 * x))]);
        Assert.True(analysis.Fit.Perfect);
        Why(Impediment.PerfectWithoutGroup, PartialF.Of(analysis.Groups[0]));
        Assert.Null(analysis.Fit.LogLikelihood);
    }

    [Fact]
    public void A_response_far_from_zero_is_not_taken_for_a_perfect_fit()
    {
        var analysis = Analyse([X], [Z], [.. X.Zip(Noise, (x, e) => 1e6 + x + e)]);
        Assert.False(analysis.Fit.Perfect);
        Assert.IsType<FTest>(PartialF.Of(analysis.Groups[0]));
    }

    [Fact]
    public void A_group_of_combinations_adds_nothing_and_names_them()
    {
        var analysis = Analyse([X], [[.. X.Select(x => (2 * x) - 5)]], Response());
        Assert.Equal(0, analysis.Groups[0].Rank);
        Why(Impediment.AddsNothing, PartialF.Of(analysis.Groups[0]));
        Why(Impediment.AddsNothing, WaldF.Of(analysis.Groups[0], analysis.Sums(0), Heteroskedastic.Hc0));
        var aliased = Assert.Single(analysis.Groups[0].Aliased);
        Assert.Equal(-5, aliased.Constant, 1e-10);
        Assert.Equal((1, 2.0), (aliased.Parts.Single().Column, Math.Round(aliased.Parts.Single().Coefficient, 10)));
    }

    [Fact]
    public void A_constant_column_is_aliased_with_the_intercept()
    {
        var analysis = Analyse([X, [.. X.Select(_ => 0.1)]], [Z], Response());
        var aliased = Assert.Single(analysis.Final.Aliased);
        Assert.Equal(0.1, aliased.Constant);
        Assert.Empty(aliased.Parts);
        Assert.Equal(2, analysis.Final.Rank);
        VectorFile.Near(Statistic(Analyse([X], [Z], Response())), Statistic(analysis), 1e-12);
    }

    [Fact]
    public void An_aliased_column_of_the_final_model_does_not_disturb_the_columns_after_it()
    {
        var doubled = X.Select(x => 2 * x).ToArray();
        var plain = Analyse([X, Z], [Noise.Select(e => e * e).ToArray()], Response());
        var aliased = Analyse([X, doubled, Z], [Noise.Select(e => e * e).ToArray()], Response());
        Assert.Equal([0, 1, 3], aliased.Fit.Columns);
        Assert.All(plain.Fit.Coefficients.Zip(aliased.Fit.Coefficients), pair => VectorFile.Near(pair.First, pair.Second, 1e-10));
        VectorFile.Near(Statistic(plain), Statistic(aliased), 1e-9);
    }

    [Fact]
    public void No_degrees_of_freedom_left_with_the_group()
    {
        var dummies = Enumerable.Range(0, 8).Select(row => X.Select((_, i) => i == row ? 1.0 : 0).ToArray()).ToArray();
        var analysis = Analyse([X], dummies, Response());
        Assert.Equal(8, analysis.Groups[0].Rank);
        Why(Impediment.NoResidualDegreesOfFreedom, PartialF.Of(analysis.Groups[0]));
        Why(Impediment.NoResidualDegreesOfFreedom, WaldF.Of(analysis.Groups[0], analysis.Sums(0), Heteroskedastic.Hc3));
    }

    [Fact]
    public void More_columns_than_rows_are_handled()
    {
        var many = Enumerable.Range(0, 15).Select(c => X.Select((x, i) => Math.Sin((c + 1) * (x + i))).ToArray()).ToArray();
        var analysis = Analyse([X], many, Response());
        Assert.Equal(8, analysis.Groups[0].Rank);
        Assert.Equal(7, analysis.Groups[0].Aliased.Count);
        Why(Impediment.NoResidualDegreesOfFreedom, PartialF.Of(analysis.Groups[0]));
    }

    [Fact]
    public void A_saturated_final_model_has_no_sigma()
    {
        var design = new MatrixDesign(true, [[1, 2, 4]], [], [1, 5, 2]);
        var wide = new MatrixDesign(true, [[1, 2, 4], [0, 1, 0]], [], [1, 5, 2]);
        Assert.Equal(1, new GroupAnalysis(design).Fit.ResidualDf);
        var fit = new GroupAnalysis(wide).Fit;
        Assert.Equal(0, fit.ResidualDf);
        Assert.Null(fit.Sigma);
        Assert.Null(fit.AdjustedRSquared);
    }

    /// <summary>Methods: HC0 and HC1 are still given, HC2, HC3 and the score form are not.</summary>
    [Fact]
    public void A_group_that_holds_a_rows_own_dummy()
    {
        var dummy = X.Select((_, i) => i == 6 ? 1.0 : 0).ToArray();
        var analysis = Analyse([X], [dummy], Response());
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0));
        Assert.Equal([6], sums.RestsOn);
        Assert.IsType<FTest>(PartialF.Of(group));
        Assert.IsType<FTest>(WaldF.Of(group, sums, Heteroskedastic.Hc0));
        Assert.IsType<FTest>(WaldF.Of(group, sums, Heteroskedastic.Hc1));
        Why(Impediment.RestsOnOneRow, WaldF.Of(group, sums, Heteroskedastic.Hc2));
        Why(Impediment.RestsOnOneRow, WaldF.Of(group, sums, Heteroskedastic.Hc3));
        Why(Impediment.RestsOnOneRow, ScoreF.Of(group, sums));
    }

    /// <summary>LM = n when e(F) qz is the same in every row: here F is zero in all rows that the group's column reaches.</summary>
    [Fact]
    public void A_score_in_which_every_row_pulls_alike_has_no_finite_F()
    {
        double[] half = [1, 1, 1, 1, 0, 0, 0, 0];
        double[] other = [.. half.Select(value => 1 - value)];
        var analysis = new GroupAnalysis(new MatrixDesign(false, [half], [[other]], [1, 2, 3, 4, 2, 2, 2, 2]));
        Why(Impediment.NotFinite, ScoreF.Of(analysis.Groups[0], analysis.Sums(0)));
        Assert.IsType<FTest>(PartialF.Of(analysis.Groups[0]));
    }

    [Fact]
    public void Without_an_intercept_sums_of_squares_are_about_zero()
    {
        var y = Response();
        var fit = new GroupAnalysis(new MatrixDesign(false, [X], [[Z]], y)).Fit;
        var slope = X.Zip(y, (x, v) => x * v).Sum() / X.Sum(x => x * x);
        VectorFile.Near(slope, fit.Coefficients[0], 1e-12);
        VectorFile.Near(1 - (X.Zip(y, (x, v) => Math.Pow(v - (slope * x), 2)).Sum() / y.Sum(v => v * v)), fit.RSquared, 1e-10);
    }

    [Fact]
    public void A_response_that_does_not_vary_has_no_overall_F() =>
        Why(Impediment.PerfectWithoutGroup, new GroupAnalysis(new MatrixDesign(true, [X], [], [.. X.Select(_ => 5.0)])).Fit.OverallF);

    [Fact]
    public void A_model_of_the_intercept_alone()
    {
        var fit = new GroupAnalysis(new MatrixDesign(true, [], [[Z]], Response())).Fit;
        VectorFile.Near(Response().Average(), fit.Coefficients[0], 1e-12);
        Why(Impediment.AddsNothing, fit.OverallF);
    }

    /// <summary>From memory, a figure of the trade: an F near 4 on 4 and 100 degrees of freedom leaves about half a percent in the tail.</summary>
    [Fact]
    public void An_F_of_four_on_4_and_100_leaves_about_half_a_percent() =>
        Assert.InRange(Numerics.Distributions.FisherF.Survival(4, 4, 100), 0.004, 0.006);

    private static GroupAnalysis Analyse(double[][] final, double[] group, double[] y) => Analyse(final, [group], y);

    private static GroupAnalysis Analyse(double[][] final, double[][] group, double[] y) => new(new MatrixDesign(true, final, [group], y));

    private static double[] Response() => [.. X.Zip(Noise, (x, e) => 1 + (0.5 * x) + e)];

    private static double Statistic(GroupAnalysis analysis) => Assert.IsType<FTest>(PartialF.Of(analysis.Groups[0])).Statistic;

    private static void Why(Impediment expected, TestResult result) => Assert.Equal(expected, Assert.IsType<NotComputable>(result).Why);
}
