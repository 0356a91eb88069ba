using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>A panel of 10 units over 12 periods, two units a cluster: on which level a group varies, and the form that asks for.</summary>
public sealed class LevelOfVariationTests
{
    private static readonly int[] Unit = [.. Enumerable.Range(0, 120).Select(i => i / 12)];
    private static readonly int[] Period = [.. Enumerable.Range(0, 120).Select(i => i % 12)];
    private static readonly double[] Macro = [.. Period.Select(t => Math.Sin(1.3 * t))];
    private static readonly double[] OfUnit = [.. Unit.Select(u => Math.Cos(2.1 * u))];
    private static readonly double[] OfCluster = [.. Unit.Select(u => Math.Cos(1.7 * (u / 2)))];
    private static readonly double[] OfRow = [.. Enumerable.Range(0, 120).Select(i => Math.Sin(12.9898 * i * i))];

    [Fact]
    public void All_columns_constant_within_period_ask_for_the_form_over_periods()
    {
        var (analysis, level) = Analyse([Macro], Structure);
        Assert.Equal(VariationLevel.Period, level.Level);
        Assert.Equal(PeriodF.Of(analysis.Groups[0], analysis.Sums(0).Period!), level.Test);
    }

    [Fact]
    public void Constant_within_cluster_asks_for_the_form_over_clusters()
    {
        var (analysis, level) = Analyse([OfCluster], Structure);
        Assert.Equal(VariationLevel.Cluster, level.Level);
        Assert.Equal(ClusterF.Of(analysis.Groups[0], analysis.Sums(0).Cluster!), level.Test);
    }

    [Fact]
    public void Constant_within_unit_alone_asks_for_the_form_over_units()
    {
        var (analysis, level) = Analyse([OfUnit], Structure);
        Assert.Equal(VariationLevel.Unit, level.Level);
        Assert.Equal(ClusterF.Of(analysis.Groups[0], analysis.Sums(0).Unit!), level.Test);
    }

    [Fact]
    public void A_mixture_takes_the_larger_p()
    {
        var (analysis, level) = Analyse([Macro, OfRow], Structure);
        Assert.Equal(VariationLevel.Mixture, level.Level);
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0));
        Assert.Equal(Math.Max(PeriodF.Of(group, sums.Period!).P!.Value, ClusterF.Of(group, sums.Cluster!).P!.Value), level.Test!.P);
    }

    [Fact]
    public void A_mixture_with_one_form_only_takes_that()
    {
        var (analysis, level) = Analyse([OfUnit, OfRow], new DependenceStructure { Unit = Structure.Unit });
        Assert.Equal(VariationLevel.Mixture, level.Level);
        Assert.Equal(ClusterF.Of(analysis.Groups[0], analysis.Sums(0).Unit!), level.Test);
    }

    [Fact]
    public void Columns_that_vary_over_rows_keep_the_declared_basis()
    {
        var (_, level) = Analyse([OfRow], Structure);
        Assert.Equal(new LevelOfVariation(VariationLevel.Rows, null), level);
    }

    /// <summary>A column that adds nothing, here the constant, has no say.</summary>
    [Fact]
    public void Aliased_columns_do_not_count()
    {
        var (analysis, level) = Analyse([OfRow, [.. Macro.Select(_ => 3.0)]], Structure);
        Assert.Equal(1, analysis.Sums(0).Levels!.Columns);
        Assert.Equal(VariationLevel.Rows, level.Level);
    }

    private static DependenceStructure Structure => new()
    {
        Cluster = new RowClasses([.. Unit.Select(u => u / 2)], 5),
        Unit = new RowClasses(Unit, 10),
        Period = new RowClasses(Period, 12),
    };

    private static (GroupAnalysis Analysis, LevelOfVariation Level) Analyse(double[][] group, DependenceStructure structure)
    {
        double[] x = [.. OfRow.Select((value, i) => (value * value) + (0.1 * i))];
        double[] y = [.. OfRow.Select((value, i) => Math.Sin(78.233 * i * i) + (0.3 * x[i]) + OfUnit[i])];
        var analysis = new GroupAnalysis(new MatrixDesign(true, [x], [group], y), structure);
        return (analysis, LevelOfVariation.Of(analysis.Groups[0], analysis.Sums(0))!);
    }
}
