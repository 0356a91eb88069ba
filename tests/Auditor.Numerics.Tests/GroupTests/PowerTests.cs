using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Tests.GroupTests;

public sealed class PowerTests
{
    /// <summary>
    /// Sample sizes for power .80 at level .05 by Cohen 1992, Psychological Bulletin 112, table 2 (multiple regression), which rests on the tables of
    /// Cohen 1988. FROM MEMORY. His are read off tables with interpolation: they agree within 2 rows or 1.5 %.
    /// </summary>
    public static TheoryData<double, int[]> Cohen => new()
    {
        { 0.02, [481, 547, 599, 645, 686, 726, 757] },
        { 0.15, [67, 76, 84, 91, 97, 102, 107] },
        { 0.35, [30, 34, 38, 42, 45, 48, 50] },
    };

    [Theory]
    [MemberData(nameof(Cohen))]
    public void Rows_needed_agree_with_published_tables(double fSquared, int[] rowsForTwoToEightPredictors)
    {
        for (var i = 0; i < rowsForTwoToEightPredictors.Length; i++)
        {
            var rows = Power.RowsNeeded(i + 2, 1, 1, fSquared / (1 + fSquared), 0.05, 0.8);
            Assert.InRange(rows!.Value - rowsForTwoToEightPredictors[i], -2 - (0.015 * rows.Value), 2 + (0.015 * rows.Value));
        }
    }

    [Fact]
    public void Rows_needed_reach_the_power_and_one_row_fewer_does_not()
    {
        var rows = Power.RowsNeeded(3, 5, 0.6, 0.01, 0.05, 0.8)!.Value;
        double At(double n) => Power.AtBound(3, n - 8, 0.6 * (n - 4), 0.01, 0.05);
        Assert.True(At(rows) >= 0.8);
        Assert.True(At(rows - 1) < 0.8);
    }

    [Fact]
    public void Clusters_needed_reach_the_power_and_one_fewer_does_not()
    {
        var clusters = Power.ClustersNeeded(2, 12.5, 20, 60, 0.05, 0.05, 0.8)!.Value;
        double At(double c) => Power.AtBound(2, (12.5 * c / 20) - 1, 60 * c / 20, 0.05, 0.05);
        Assert.True(At(clusters) >= 0.8);
        Assert.True(At(clusters - 1) < 0.8);
        Assert.Null(Power.ClustersNeeded(2, 12.5, 20, 1e-13, 0.05, 0.05, 0.8));
    }

    [Fact]
    public void Periods_needed_reach_the_power_and_one_fewer_does_not()
    {
        var periods = Power.PeriodsNeeded(2, 40, 30, 0.05, 0.05, 0.8)!.Value;
        double At(double t) => Power.AtBound(2, PeriodF.CosineCount((int)t) - 1, 30 * t / 40, 0.05, 0.05);
        Assert.True(At(periods) >= 0.8);
        Assert.True(At(periods - 1) < 0.8);
        Assert.Null(Power.PeriodsNeeded(2, 40, 1e-9, 0.05, 0.05, 0.8));
    }

    [Fact]
    public void The_smallest_detectable_effect_has_the_wanted_power()
    {
        var fSquared = Power.SmallestDetectable(2, 97, 100, 0.05, 0.8)!.Value;
        VectorFile.Near(0.8, Power.AtBound(2, 97, 100, fSquared / (1 + fSquared), 0.05), 1e-9);
    }

    [Fact]
    public void No_practicable_number_of_rows_is_null() => Assert.Null(Power.RowsNeeded(1, 2, 1e-14, 0.01, 0.05, 0.8));
}
