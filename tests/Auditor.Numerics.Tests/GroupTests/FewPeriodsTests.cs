using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>
/// How few periods and clusters make a one-column group untestable at 5 %, beside an intercept: the numbers that README.md states. Expected: the ceiling from its
/// definition in numpy and scipy (the sums u qz² by period or cluster, phi = 1 - sum (qz q_F)², their form on 1 and nu or C - 1 degrees of freedom).
/// </summary>
public sealed class FewPeriodsTests
{
    private const double Level = 0.05;

    [Theory]
    [InlineData(58, 0, false)]
    [InlineData(59, 0, true)]
    [InlineData(144, 0.8, false)]
    [InlineData(145, 0.8, true)]
    public void A_trend_or_a_step_needs_so_many_periods(int periods, double from, bool testable)
    {
        double[] column = [.. Enumerable.Range(0, periods).Select(t => from == 0 ? t : t >= from * periods ? 1.0 : 0)];
        var sums = Analysed(column, periods, 1, classes => new DependenceStructure { Period = classes });
        Assert.Equal(testable, PeriodF.Ceiling(sums.Groups[0], sums.Sums(0).Period!).P <= Level);
    }

    [Theory]
    [InlineData(2, 100, false)]
    [InlineData(3, 20, true)]
    [InlineData(3, 30, false)]
    [InlineData(4, 30, true)]
    [InlineData(4, 100, true)]
    public void What_few_clusters_have_alone_needs_so_many_of_them(int with, int clusters, bool testable)
    {
        double[] column = [.. Enumerable.Range(0, 2 * clusters).Select(row => row / 2 < with ? 1.0 : 0)];
        var sums = Analysed(column, clusters, 2, classes => new DependenceStructure { Cluster = classes });
        Assert.Equal(testable, ClusterF.Ceiling(sums.Groups[0], sums.Sums(0).Cluster!).P <= Level);
    }

    private static GroupAnalysis Analysed(double[] column, int classes, int rowsEach, Func<RowClasses, DependenceStructure> structure)
    {
        var codes = Enumerable.Range(0, column.Length).Select(row => row / rowsEach).ToArray();
        double[] response = [.. column.Select((value, row) => value + Math.Sin(row * 1.7))];
        return new GroupAnalysis(new MatrixDesign(true, [], [[column]], response), structure(new RowClasses(codes, classes)));
    }
}
