using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>CR1, CR2 and its degrees of freedom, and Newey–West, against R's clubSandwich 0.5.8 and sandwich 3.0.2 (values/make_values.R).</summary>
public sealed class ClusterValuesTests
{
    public static TheoryData<string> Clustered => [.. DependenceValues.Names("clustered")];

    public static TheoryData<string> Serial => [.. DependenceValues.Names("newey_west")];

    [Theory]
    [MemberData(nameof(Clustered))]
    public void Cr1_and_Cr2_agree_with_R(string name)
    {
        var value = DependenceValues.Case("clustered", name);
        var analysis = new GroupAnalysis(
            DependenceValues.Design(value), new DependenceStructure { Cluster = DependenceValues.Classes(value, "cluster") });
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0).Cluster!);

        Assert.Equal(value.GetProperty("q").GetInt32(), group.Rank);
        var cr1 = Assert.IsType<FTest>(Cr1.Of(group, sums));
        VectorFile.Near(value.GetProperty("cr1_f").GetDouble(), cr1.Statistic);
        Assert.Equal(sums.Count - 1, cr1.Df2);
        var cr2 = Assert.IsType<FTest>(Cr2.Of(group, sums).Test);
        VectorFile.Near(value.GetProperty("cr2_f").GetDouble(), cr2.Statistic);
        VectorFile.Near(value.GetProperty("cr2_df1").GetDouble(), cr2.Df1);
        VectorFile.Near(value.GetProperty("cr2_df2").GetDouble(), cr2.Df2);
        VectorFile.Near(value.GetProperty("cr2_p").GetDouble(), cr2.P);
    }

    [Fact]
    public void One_column_has_Satterthwaite_degrees_of_freedom()
    {
        var value = DependenceValues.Case("clustered", "unbalanced clusters, one column");
        var analysis = new GroupAnalysis(
            DependenceValues.Design(value), new DependenceStructure { Cluster = DependenceValues.Classes(value, "cluster") });
        var test = Assert.IsType<FTest>(Cr2.Of(analysis.Groups[0], analysis.Sums(0).Cluster!).Test);
        VectorFile.Near(Math.Pow(value.GetProperty("satterthwaite_t").GetDouble(), 2), test.Statistic);
        VectorFile.Near(value.GetProperty("satterthwaite_df").GetDouble(), test.Df2);
    }

    [Theory]
    [MemberData(nameof(Serial))]
    public void Newey_West_agrees_with_R(string name)
    {
        var value = DependenceValues.Case("newey_west", name);
        var analysis = new GroupAnalysis(
            DependenceValues.Design(value), new DependenceStructure { Period = DependenceValues.Classes(value, "period") });
        var lag = value.GetProperty("lag").GetInt32();
        var estimate = NeweyWest.Of(analysis.Groups[0], analysis.Sums(0).Period!, lag);
        var test = Assert.IsType<FTest>(estimate.Test);
        Assert.Equal(lag, estimate.Lag);
        VectorFile.Near(value.GetProperty("f").GetDouble(), test.Statistic);
        Assert.Equal(PartialF.ResidualDf(analysis.Groups[0]), test.Df2);
    }

    /// <summary>The rule in whole numbers; 4 (100/100)^(2/9) is exactly 4, which roots in doubles can miss.</summary>
    [Theory]
    [InlineData(19, 2)]
    [InlineData(80, 3)]
    [InlineData(100, 4)]
    [InlineData(99, 3)]
    [InlineData(51_200, 16)]
    [InlineData(51_199, 15)]
    public void Lag_rule(int periods, int lag) => Assert.Equal(lag, NeweyWest.Rule(periods));

    /// <summary>0.4 (125)^(2/3) is exactly 10.</summary>
    [Theory]
    [InlineData(1, 0)]
    [InlineData(3, 0)]
    [InlineData(4, 1)]
    [InlineData(60, 6)]
    [InlineData(124, 9)]
    [InlineData(125, 10)]
    [InlineData(1_000_000, 4000)]
    public void Number_of_cosines(int periods, int cosines) => Assert.Equal(cosines, PeriodF.CosineCount(periods));
}
