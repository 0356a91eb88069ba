using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Parts;
using Auditor.Numerics.Tests.GroupTests;

namespace Auditor.Numerics.Tests.Parts;

/// <summary>
/// Every form of the test that effects are equal, made from the parts' fits, against the same form of a group's test (verified elsewhere) on all rows at once with the
/// columns of both models written out.
/// </summary>
public sealed class AtOnceTests
{
    public static TheoryData<int, bool, bool> Cases => new()
    {
        { 2, false, false },
        { 3, false, false },
        { 2, true, false },
        { 3, false, true },
    };

    [Theory]
    [MemberData(nameof(Cases))]
    public void Every_form_is_that_of_the_models_written_out(int parts, bool weighted, bool copied)
    {
        var (rows, atOnce) = Both(parts, weighted, copied);
        var group = atOnce.Groups[0];
        Assert.Equal(2 * (parts - 1), group.Rank);
        Near(PartialF.Of(group), EqualEffectsF.Of(rows.Contrast));
        Near(WaldF.Of(group, atOnce.Sums(0), Heteroskedastic.Hc3), EqualEffectsHc3.Of(rows.Contrast, rows.Sums));
        Near(ClusterF.Of(group, atOnce.Sums(0).Cluster!), EqualEffectsOverClusters.Of(rows.Contrast, rows.Clusters));
        Near(ClusterF.Ceiling(group, atOnce.Sums(0).Cluster!), EqualEffectsOverClusters.Ceiling(rows.Contrast, rows.Clusters));
        Near(PeriodF.Of(group, atOnce.Sums(0).Period!), EqualEffectsOverPeriods.Of(rows.Contrast, rows.Periods));
        Near(PeriodF.Ceiling(group, atOnce.Sums(0).Period!), EqualEffectsOverPeriods.Ceiling(rows.Contrast, rows.Periods));
    }

    [Fact]
    public void A_column_without_values_in_a_part_is_compared_where_it_has_some()
    {
        var data = new DependentRows(150, 12, 40, seed: 8);
        int[] part = [.. Enumerable.Range(0, 150).Select(i => i % 3)];
        double[] halfThere = [.. data.Group[0].Select((value, i) => part[i] == 1 ? 0 : value)];
        double[] onlyThere = [.. data.Final[1].Select((value, i) => part[i] == 0 ? value * value : 0)];
        var rows = new PartRows([data.Final[0]], [data.Group[1], halfThere, onlyThere], data.Response, part, data.Structure);
        var atOnce = rows.AtOnce();
        Assert.Equal(3, atOnce.Groups[0].Rank);
        Near(PartialF.Of(atOnce.Groups[0]), EqualEffectsF.Of(rows.Contrast));
        Near(WaldF.Of(atOnce.Groups[0], atOnce.Sums(0), Heteroskedastic.Hc3), EqualEffectsHc3.Of(rows.Contrast, rows.Sums));
        Near(ClusterF.Of(atOnce.Groups[0], atOnce.Sums(0).Cluster!), EqualEffectsOverClusters.Of(rows.Contrast, rows.Clusters));
    }

    [Fact]
    public void One_part_leaves_nothing_to_compare()
    {
        var data = new DependentRows(60, 6, 12);
        var rows = new PartRows(data.Final, data.Group, data.Response, new int[60]);
        Assert.Equal(TestResult.None(Impediment.NothingToCompare), EqualEffectsF.Of(rows.Contrast));
        Assert.Equal(TestResult.None(Impediment.NothingToCompare), EqualEffectsHc3.Of(rows.Contrast, rows.Sums));
    }

    [Fact]
    public void A_column_that_each_part_has_for_itself_leaves_nothing_to_compare()
    {
        var data = new DependentRows(90, 9, 30);
        int[] part = [.. Enumerable.Range(0, 90).Select(i => i % 2)];
        double[] In(int which) => [.. data.Group[0].Select((value, i) => part[i] == which ? value : 0)];
        var rows = new PartRows(data.Final, [In(0), In(1)], data.Response, part);
        Assert.Equal(TestResult.None(Impediment.NothingToCompare), EqualEffectsF.Of(rows.Contrast));
    }

    [Fact]
    public void More_directions_than_are_compared_give_no_contrast()
    {
        var data = new DependentRows(80, 8, 20);
        var group = new PartRows(data.Final, data.Group, data.Response, new int[80]).Parts[0].Groups[0];
        Assert.NotNull(EffectContrast.Of([.. Enumerable.Repeat(group, 300)]));
        Assert.Null(EffectContrast.Of([.. Enumerable.Repeat(group, 301)]));
    }

    [Fact]
    public void A_row_with_a_dummy_of_its_own_leaves_no_form_by_HC3()
    {
        var data = new DependentRows(60, 6, 12);
        int[] part = [.. Enumerable.Range(0, 60).Select(i => i % 2)];
        double[] own = [.. Enumerable.Range(0, 60).Select(i => i is 4 or 5 ? 1.0 : 0)];
        var rows = new PartRows(data.Final, [own], data.Response, part);
        Assert.Equal(TestResult.None(Impediment.RestsOnOneRow), EqualEffectsHc3.Of(rows.Contrast, rows.Sums));
        Near(PartialF.Of(rows.AtOnce().Groups[0]), EqualEffectsF.Of(rows.Contrast));
    }

    private static (PartRows Rows, Tests.GroupAnalysis AtOnce) Both(int parts, bool weighted, bool copied)
    {
        var data = new DependentRows(140, 12, 40, seed: 5);
        int[] part = [.. Enumerable.Range(0, 140).Select(i => (i * 7 / 5) % parts)];
        var rows = new PartRows(data.Final, data.Group, data.Response, part, data.Structure, weighted ? data.Weights : null, copied ? data.Copies : null);
        return (rows, rows.AtOnce());
    }

    private static void Near(TestResult expected, TestResult actual)
    {
        var (wanted, found) = (Assert.IsType<FTest>(expected), Assert.IsType<FTest>(actual));
        Assert.Equal(wanted.Df1, found.Df1);
        Assert.Equal(wanted.Df2, found.Df2);
        Assert.Equal(1, found.Statistic / wanted.Statistic, 1e-9);
        Assert.Equal(1, found.Probability / wanted.Probability, 1e-8);
    }
}
