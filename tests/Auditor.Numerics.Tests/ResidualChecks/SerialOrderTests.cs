using Auditor.Numerics.ResidualChecks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>From the definition, no source.</summary>
public sealed class SerialOrderTests
{
    [Fact]
    public void A_lag_reaches_neither_over_a_gap_nor_into_another_unit()
    {
        var order = SerialOrder.Of([1, 0, 1, 0, 0, 1], [5, 3, 7, 1, 2, 6])!;
        Assert.Equal([3, 4, 1, 0, 5, 2], order.Positions);
        Assert.Equal([-1, 0, 1, -1, 3, 4], order.Lag(1));
        Assert.Equal([-1, -1, 0, -1, -1, 3], order.Lag(2));
        Assert.Equal([-1, -1, -1, -1, -1, -1], order.Lag(3));
        Assert.Equal((2, 0), (order.Units, order.Gaps));
    }

    [Fact]
    public void A_missing_period_is_a_gap()
    {
        var order = SerialOrder.Of([0, 0, 0, 0], [1, 2, 4, 5])!;
        Assert.Equal([-1, 0, -1, 2], order.Lag(1));
        Assert.Equal([-1, -1, 1, -1], order.Lag(2));
        Assert.Equal([-1, -1, 0, 1], order.Lag(3));
        Assert.Equal(1, order.Gaps);
    }

    [Fact]
    public void Two_rows_of_one_unit_and_period_have_no_order() => Assert.Null(SerialOrder.Of([0, 0, 1], [4, 4, 4]));

    [Fact]
    public void An_order_of_positions_has_no_gaps()
    {
        var order = SerialOrder.Of([2, 0, 1]);
        Assert.Equal([2, 0, 1], order.Positions);
        Assert.Equal([-1, 0, 1], order.Lag(1));
        Assert.Equal((1, 0), (order.Units, order.Gaps));
    }
}
