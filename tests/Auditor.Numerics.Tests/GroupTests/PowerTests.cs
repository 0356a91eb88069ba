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
    public void The_smallest_detectable_effect_has_the_wanted_power()
    {
        var fSquared = Power.SmallestDetectable(2, 97, 100, 0.05, 0.8)!.Value;
        VectorFile.Near(0.8, Power.AtBound(2, 97, 100, fSquared / (1 + fSquared), 0.05), 1e-9);
    }

    [Fact]
    public void No_practicable_number_of_rows_is_null() => Assert.Null(Power.RowsNeeded(1, 2, 1e-14, 0.01, 0.05, 0.8));
}
