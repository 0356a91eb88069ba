using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;
using CsCheck;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>Every edge of the forms over clusters and periods. Expected values follow from the definitions (no source).</summary>
public sealed class DependenceEdgeCaseTests
{
    private static readonly DependentRows Rows = new(70, 13, 20);

    [Fact]
    public void Nothing_is_computed_for_what_is_not_declared()
    {
        var analysis = Rows.Analyse(new DependenceStructure { Period = Rows.Structure.Period });
        Assert.Null(analysis.Sums(0).Cluster);
        Assert.Null(analysis.Sums(0).Unit);
        Assert.NotNull(analysis.Sums(0).Period);
        Assert.Null(new GroupAnalysis(new MatrixDesign(true, Rows.Final, [Rows.Group], Rows.Response)).Sums(0).Levels);
    }

    /// <summary>With room for few clusters at a time the rows are passed again; what needs all clusters at once says that they are too many.</summary>
    [Fact]
    public void Sums_that_do_not_fit_in_memory_take_several_passes_and_give_the_same_bits()
    {
        var whole = Rows.Analyse();
        var parts = Rows.Analyse(Rows.Structure with { MostDoubles = 100 });
        foreach (var g in new[] { 0, 1 })
        {
            var (group, one, several) = (g == 0 ? whole.Groups[0] : whole.All, whole.Sums(g), parts.Sums(g));
            Assert.Equal(ClusterF.Of(group, one.Cluster!), ClusterF.Of(group, several.Cluster!));
            Assert.Equal(Cr1.Of(group, one.Cluster!), Cr1.Of(group, several.Cluster!));
            Assert.Equal(PeriodF.Of(group, one.Period!), PeriodF.Of(group, several.Period!));
            Assert.Equal(NeweyWest.Of(group, one.Period!), NeweyWest.Of(group, several.Period!));
            Why(Impediment.TooManyClusters, Cr2.Of(group, several.Cluster!).Test);
            Why(Impediment.TooManyClusters, WildBootstrap.Of(group, several.Cluster!, 99, 0.05, new Generator(1)));
            Why(Impediment.TooManyPeriods, PeriodWald.Of(group, several.Period!).Test);
        }
    }

    [Fact]
    public void Above_5000_clusters_CR1_stands_in_for_CR2()
    {
        const int C = 5001;
        var rows = new DependentRows(2 * C, C, 10);
        var analysis = rows.Analyse();
        Why(Impediment.TooManyClusters, Cr2.Of(analysis.Groups[0], analysis.Sums(0).Cluster!).Test);
        Assert.IsType<FTest>(Cr1.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Assert.IsType<FTest>(ClusterF.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
    }

    [Fact]
    public void One_cluster_and_one_period_are_untestable() => AllWithoutValue(1, Impediment.TooFewClusters, Impediment.TooFewPeriods);

    [Fact]
    public void As_many_directions_as_clusters_are_untestable() => AllWithoutValue(2, Impediment.TooFewClusters, Impediment.TooFewPeriods);

    private static void AllWithoutValue(int classes, Impediment cluster, Impediment period)
    {
        var codes = Enumerable.Range(0, 70).Select(i => i % classes).ToArray();
        var both = new RowClasses(codes, classes);
        var analysis = Rows.Analyse(new DependenceStructure { Cluster = both, Unit = both, Period = both });
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0));
        Assert.Same(sums.Cluster, sums.Unit);
        Why(cluster, ClusterF.Of(group, sums.Cluster!));
        Why(cluster, ClusterF.Ceiling(group, sums.Cluster!));
        Why(cluster, Cr1.Of(group, sums.Cluster!));
        Why(cluster, Cr2.Of(group, sums.Cluster!).Test);
        Why(cluster, WildBootstrap.Of(group, sums.Cluster!, 99, 0.05, new Generator(1)));
        Why(period, PeriodF.Of(group, sums.Period!));
        Why(period, PeriodWald.Of(group, sums.Period!).Test);
        Why(period, NeweyWest.Of(group, sums.Period!).Test);
    }

    /// <summary>Clusters without a row of the group do not count: a dummy within 4 of 13 clusters, with a dummy of each cluster in the final model.</summary>
    [Fact]
    public void Only_clusters_with_information_count()
    {
        var own = Enumerable.Range(0, 12).Select(c => Rows.Cluster.Select(code => code == c ? 1.0 : 0).ToArray()).ToArray();
        double[] some = [.. Rows.Group[0].Zip(Rows.Cluster, (value, code) => code < 4 ? value : 0)];
        var analysis = new GroupAnalysis(new MatrixDesign(true, own, [[some]], Rows.Response), Rows.Structure);
        Assert.Equal(4, analysis.Sums(0).Cluster!.Contributing);
        Assert.Equal(3, Assert.IsType<FTest>(ClusterF.Of(analysis.Groups[0], analysis.Sums(0).Cluster!)).Df2);
        Assert.Null(EffectiveClusters.Of(analysis.Groups[0], analysis.Sums(0).Cluster!)!.Correlated);
    }

    [Fact]
    public void A_dummy_of_one_cluster_rests_on_it()
    {
        double[] dummy = [.. Rows.Cluster.Select(code => code == 3 ? 1.0 : 0)];
        var analysis = new GroupAnalysis(new MatrixDesign(true, Rows.Final, [[dummy]], Rows.Response), Rows.Structure);
        Why(Impediment.RestsOnOneCluster, Cr2.Of(analysis.Groups[0], analysis.Sums(0).Cluster!).Test);
        Assert.IsType<FTest>(Cr1.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Assert.True(ClusterF.Ceiling(analysis.Groups[0], analysis.Sums(0).Cluster!).P > 0.05);
    }

    /// <summary>The residuals of the larger model add up to zero in each cluster: CR1 would divide by rounding.</summary>
    [Fact]
    public void A_dummy_for_each_cluster_has_no_CR1()
    {
        var dummies = Enumerable.Range(0, 12).Select(c => Rows.Cluster.Select(code => code == c ? 1.0 : 0).ToArray()).ToArray();
        var analysis = new GroupAnalysis(new MatrixDesign(true, Rows.Final, [dummies], Rows.Response), Rows.Structure);
        Why(Impediment.SingularCovariance, Cr1.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Why(Impediment.RestsOnOneCluster, Cr2.Of(analysis.Groups[0], analysis.Sums(0).Cluster!).Test);
    }

    [Fact]
    public void A_perfect_fit_has_no_robust_form()
    {
        double[] exact = [.. Rows.Final[0].Zip(Rows.Group[0], (x, z) => x + (2 * z))];
        var analysis = new GroupAnalysis(new MatrixDesign(true, Rows.Final, [Rows.Group], exact), Rows.Structure);
        Why(Impediment.PerfectWithGroup, ClusterF.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Why(Impediment.PerfectWithGroup, PeriodF.Of(analysis.Groups[0], analysis.Sums(0).Period!));
        Why(Impediment.PerfectWithGroup, WildBootstrap.Of(analysis.Groups[0], analysis.Sums(0).Cluster!, 99, 0.05, new Generator(1)));
    }

    [Fact]
    public void A_group_that_adds_nothing()
    {
        var analysis = new GroupAnalysis(new MatrixDesign(true, Rows.Final, [[Rows.Final[0]]], Rows.Response), Rows.Structure);
        Why(Impediment.AddsNothing, ClusterF.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Why(Impediment.AddsNothing, NeweyWest.Of(analysis.Groups[0], analysis.Sums(0).Period!).Test);
        Assert.Null(EffectiveClusters.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Assert.Equal(VariationLevel.Rows, LevelOfVariation.Of(analysis.Groups[0], analysis.Sums(0))!.Level);
    }

    /// <summary>A row with its own dummy in the final model leaves all forms as if it were deleted, but for n in CR1's factor.</summary>
    [Fact]
    public void A_row_with_leverage_one_is_as_good_as_deleted()
    {
        double[] dummy = [.. Enumerable.Range(0, 70).Select(i => i == 69 ? 1.0 : 0)];
        var with = new GroupAnalysis(new MatrixDesign(true, [.. Rows.Final, dummy], [Rows.Group], Rows.Response), Rows.Structure);
        double[] Cut(double[] column) => column[..69];
        var without = new GroupAnalysis(
            new MatrixDesign(true, [.. Rows.Final.Select(Cut)], [[.. Rows.Group.Select(Cut)]], Cut(Rows.Response)),
            new DependenceStructure { Cluster = new RowClasses(Rows.Cluster[..69], 13), Period = new RowClasses(Rows.Period[..69], 20) });
        var (a, b) = (with.Sums(0), without.Sums(0));
        VectorFile.Near(Statistic(ClusterF.Of(without.Groups[0], b.Cluster!)), Statistic(ClusterF.Of(with.Groups[0], a.Cluster!)));
        VectorFile.Near(Statistic(Cr2.Of(without.Groups[0], b.Cluster!).Test), Statistic(Cr2.Of(with.Groups[0], a.Cluster!).Test));
        VectorFile.Near(Statistic(PeriodF.Of(without.Groups[0], b.Period!)), Statistic(PeriodF.Of(with.Groups[0], a.Period!)));
        VectorFile.Near(Statistic(PeriodWald.Of(without.Groups[0], b.Period!).Test), Statistic(PeriodWald.Of(with.Groups[0], a.Period!).Test));
    }

    [Fact]
    public void Copies_are_rows_written_out()
    {
        var copied = Rows.Analyse(copied: true);
        int[] rows = [.. Enumerable.Range(0, 70).SelectMany(i => Enumerable.Repeat(i, (int)Rows.Copies[i]))];
        double[] Out(double[] column) => [.. rows.Select(i => column[i])];
        var written = new GroupAnalysis(
            new MatrixDesign(true, [.. Rows.Final.Select(Out)], [[.. Rows.Group.Select(Out)]], Out(Rows.Response)),
            new DependenceStructure { Cluster = new RowClasses([.. rows.Select(i => Rows.Cluster[i])], 13), Period = new RowClasses([.. rows.Select(i => Rows.Period[i])], 20) });
        var (a, b) = (copied.Sums(0), written.Sums(0));
        VectorFile.Near(Statistic(ClusterF.Of(written.Groups[0], b.Cluster!)), Statistic(ClusterF.Of(copied.Groups[0], a.Cluster!)));
        VectorFile.Near(Statistic(Cr1.Of(written.Groups[0], b.Cluster!)), Statistic(Cr1.Of(copied.Groups[0], a.Cluster!)));
        VectorFile.Near(Statistic(Cr2.Of(written.Groups[0], b.Cluster!).Test), Statistic(Cr2.Of(copied.Groups[0], a.Cluster!).Test));
        VectorFile.Near(Statistic(NeweyWest.Of(written.Groups[0], b.Period!).Test), Statistic(NeweyWest.Of(copied.Groups[0], a.Period!).Test));
        VectorFile.Near(Statistic(PeriodWald.Of(written.Groups[0], b.Period!).Test), Statistic(PeriodWald.Of(copied.Groups[0], a.Period!).Test));
    }

    [Theory]
    [InlineData(0.001)]
    [InlineData(1000)]
    public void The_scale_of_the_weights_does_not_matter(double scale)
    {
        var plain = Rows.Analyse(weighted: true);
        var scaled = new GroupAnalysis(
            new MatrixDesign(true, Rows.Final, [Rows.Group], Rows.Response, [.. Rows.Weights.Select(weight => weight * scale)]), Rows.Structure);
        var (a, b) = (plain.Sums(0), scaled.Sums(0));
        VectorFile.Near(Statistic(ClusterF.Of(plain.Groups[0], a.Cluster!)), Statistic(ClusterF.Of(scaled.Groups[0], b.Cluster!)));
        VectorFile.Near(Statistic(Cr2.Of(plain.Groups[0], a.Cluster!).Test), Statistic(Cr2.Of(scaled.Groups[0], b.Cluster!).Test));
        VectorFile.Near(Statistic(PeriodWald.Of(plain.Groups[0], a.Period!).Test), Statistic(PeriodWald.Of(scaled.Groups[0], b.Period!).Test));
        VectorFile.Near(
            EffectiveClusters.Of(plain.Groups[0], a.Cluster!)!.Uncorrelated, EffectiveClusters.Of(scaled.Groups[0], b.Cluster!)!.Uncorrelated);
    }

    [Fact]
    public void Every_form_has_a_value_or_a_reason() =>
        Gen.Select(Gen.Int[6, 30], Gen.Int[1, 9], Gen.Int[1, 12], Gen.ULong[0, 1UL << 40]).Sample(
            (n, clusters, periods, seed) =>
            {
                var rows = new DependentRows(n, Math.Min(n, clusters), Math.Min(n, periods), seed);
                var analysis = rows.Analyse(new DependenceStructure { Cluster = RowClasses.Ranked(rows.Cluster), Period = RowClasses.Ranked(rows.Period) });
                Assert.All(AllForms(analysis), Sound);
            },
            iter: 300);

    private static IEnumerable<TestResult> AllForms(GroupAnalysis analysis)
    {
        var (group, cluster, period) = (analysis.Groups[0], analysis.Sums(0).Cluster!, analysis.Sums(0).Period!);
        yield return ClusterF.Of(group, cluster);
        yield return ClusterF.Ceiling(group, cluster);
        yield return Cr1.Of(group, cluster);
        yield return Cr2.Of(group, cluster).Test;
        yield return WildBootstrap.Of(group, cluster, 49, 0.05, new Generator(1));
        yield return PeriodF.Of(group, period);
        yield return PeriodF.Ceiling(group, period);
        yield return PeriodWald.Of(group, period).Test;
        yield return NeweyWest.Of(group, period).Test;
    }

    private static void Sound(TestResult result)
    {
        Assert.True(result is NotComputable || result.P is >= 0 and <= 1, $"{result}");
        if (result is FTest f)
        {
            Assert.True(double.IsFinite(f.Statistic) && f.Statistic >= 0 && double.IsFinite(f.Df2), $"{f}");
        }
    }

    private static double Statistic(TestResult result) => Assert.IsType<FTest>(result).Statistic;

    private static void Why(Impediment expected, TestResult result) => Assert.Equal(expected, Assert.IsType<NotComputable>(result).Why);
}
