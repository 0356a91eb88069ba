using Auditor.Numerics.GroupTests;
using CsCheck;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>What must not change an F, and what must hold of any two nested fits (common practice, no source: they follow from the definitions).</summary>
public sealed class InvarianceProperties
{
    private const double Tolerance = 1e-7;

    [Fact]
    public void The_reference_level_does_not_matter() => RandomDesign.Any.Sample(d =>
        SameTests(One(d, [d.X], d.Coded(0)), One(d, [d.X], d.Coded(2))));

    [Fact]
    public void The_order_of_the_columns_does_not_matter() => RandomDesign.Any.Sample(d =>
        SameTests(One(d, [d.X], [d.Z1, d.Z2]), One(d, [d.X], [d.Z2, d.Z1])));

    [Fact]
    public void Scale_and_origin_of_columns_and_response_do_not_matter() => RandomDesign.Any.Sample(d =>
    {
        double[] Moved(double[] values, double scale, double shift) => [.. values.Select(value => (scale * value) + shift)];
        var moved = new GroupAnalysis(new MatrixDesign(true, [Moved(d.X, 1e4, 50)], [[Moved(d.Z1, -3, 1000), Moved(d.Z2, 1e-3, 1)]], Moved(d.Y, 20, -7)));
        SameTests(One(d, [d.X], [d.Z1, d.Z2]), moved);
    });

    [Fact]
    public void The_order_of_the_rows_and_the_size_of_the_blocks_do_not_matter() => RandomDesign.Any.Sample(d =>
    {
        double[] Turned(double[] values) => [.. values.Reverse()];
        var turned = new MatrixDesign(true, [Turned(d.X)], [[Turned(d.Z1), Turned(d.Z2)]], Turned(d.Y), blockRows: 512);
        SameTests(One(d, [d.X], [d.Z1, d.Z2]), new GroupAnalysis(turned));
    });

    [Fact]
    public void An_aliased_column_adds_nothing() => RandomDesign.Any.Sample(d =>
    {
        double[] sum = [.. d.X.Zip(d.Z1, (x, z) => (2 * x) - z + 4)];
        var with = One(d, [d.X], [d.Z1, d.Z2, sum]);
        var aliased = Assert.Single(with.Groups[0].Aliased);
        Assert.Equal(4, aliased.Constant, 1e-6);
        Assert.Equal([2, -1], aliased.Parts.Select(part => Math.Round(part.Coefficient, 6)));
        SameTests(One(d, [d.X], [d.Z1, d.Z2]), with);
    });

    [Fact]
    public void A_dummy_of_one_row_elsewhere_equals_deleting_the_row() => RandomDesign.Any.Sample(d =>
    {
        var dummy = new double[d.N];
        dummy[3] = 1;
        double[] Without(double[] values) => [.. values.Where((_, i) => i != 3)];
        var deleted = new MatrixDesign(true, [Without(d.X)], [[Without(d.Z1), Without(d.Z2)]], Without(d.Y));
        SameTests(new GroupAnalysis(deleted), One(d, [d.X, dummy], [d.Z1, d.Z2]), leaveOut: Heteroskedastic.Hc1);
    });

    [Fact]
    public void A_group_declared_elsewhere_does_not_matter() => RandomDesign.Any.Sample(d =>
    {
        var both = new GroupAnalysis(new MatrixDesign(true, [d.X], [d.Coded(1), [d.Z1, d.Z2]], d.Y));
        SameTests(One(d, [d.X], [d.Z1, d.Z2]), both, inSecond: 1);
    });

    [Fact]
    public void The_residual_sum_of_squares_never_grows_and_df1_is_the_rank_added() => RandomDesign.Any.Sample(d =>
    {
        var analysis = One(d, [d.X], [d.Z1, d.Z2]);
        var group = analysis.Groups[0];
        Assert.True(group.SumOfSquares >= 0);
        Assert.True(group.RssWith <= analysis.Final.Rss * (1 + 1e-12));
        Assert.Equal(group.RankWith - analysis.Final.Rank, group.Rank);
        VectorFile.Near(analysis.Final.Rss, group.RssWithout, 1e-10);
    });

    [Fact]
    public void For_one_column_F_is_the_square_of_t() => RandomDesign.Any.Sample(d =>
    {
        var added = Assert.IsType<FTest>(PartialF.Of(One(d, [d.X], [d.Z1]).Groups[0]));
        var fit = One(d, [d.X, d.Z1], []).Fit;
        var t = CoefficientTest.Of(fit.Coefficients[2], fit.StandardErrors![2], fit.ResidualDf);
        VectorFile.Near(t.T * t.T, added.Statistic, Tolerance);
        VectorFile.Near(t.P, added.P, 1e-6);
    });

    [Fact]
    public void Frequency_weights_equal_the_expanded_data() => RandomDesign.Any.Sample(d =>
    {
        var copies = Enumerable.Range(0, d.N).Select(i => (double)((i * 7 % 3) + 1)).ToArray();
        double[] Expanded(double[] values) => [.. values.SelectMany((value, i) => Enumerable.Repeat(value, (int)copies[i]))];
        var weighted = new GroupAnalysis(new MatrixDesign(true, [d.X], [[d.Z1, d.Z2]], d.Y, copies: copies));
        var expanded = new GroupAnalysis(new MatrixDesign(true, [Expanded(d.X)], [[Expanded(d.Z1), Expanded(d.Z2)]], Expanded(d.Y)));
        SameTests(expanded, weighted);
        VectorFile.Near(expanded.Fit.Rss, weighted.Fit.Rss, 1e-9);
        VectorFile.Near(expanded.Fit.LogLikelihood!.Value, weighted.Fit.LogLikelihood, 1e-9);
        Assert.All(expanded.Fit.StandardErrors!.Zip(weighted.Fit.StandardErrors!), pair => VectorFile.Near(pair.First, pair.Second, 1e-9));
    });

    [Fact]
    public void The_scale_of_precision_weights_does_not_matter_to_any_test() => RandomDesign.Any.Sample(d =>
    {
        var weights = d.Z2.Select(z => 1 + (z * z)).ToArray();
        GroupAnalysis Weighted(double scale) =>
            new(new MatrixDesign(true, [d.X], [[d.Z1, d.Z2]], d.Y, weights: [.. weights.Select(weight => weight * scale)]));
        SameTests(Weighted(1), Weighted(1000));
    });

    private static GroupAnalysis One(RandomDesign d, double[][] final, double[][] group) =>
        new(new MatrixDesign(true, final, group.Length == 0 ? [] : [group], d.Y));

    private static void SameTests(GroupAnalysis first, GroupAnalysis second, int inSecond = 0, Heteroskedastic? leaveOut = null)
    {
        Same(PartialF.Of(first.Groups[0]), PartialF.Of(second.Groups[inSecond]));
        Same(ScoreF.Of(first.Groups[0], first.Sums(0)), ScoreF.Of(second.Groups[inSecond], second.Sums(inSecond)));
        foreach (var estimator in Enum.GetValues<Heteroskedastic>().Where(estimator => estimator != leaveOut))
        {
            Same(WaldF.Of(first.Groups[0], first.Sums(0), estimator), WaldF.Of(second.Groups[inSecond], second.Sums(inSecond), estimator));
        }
    }

    private static void Same(TestResult first, TestResult second)
    {
        var (a, b) = (Assert.IsType<FTest>(first), Assert.IsType<FTest>(second));
        Assert.True(Math.Abs(a.Statistic - b.Statistic) <= Tolerance * Math.Max(1e-6, a.Statistic), $"{a.Statistic:R} and {b.Statistic:R}");
        Assert.Equal((a.Df1, a.Df2), (b.Df1, b.Df2));
    }
}
