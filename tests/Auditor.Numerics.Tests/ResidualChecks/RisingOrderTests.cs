using Auditor.Numerics.Random;
using Auditor.Numerics.ResidualChecks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>The order of many numbers is that which comparing them gives.</summary>
public sealed class RisingOrderTests
{
    [Theory]
    [InlineData(700)]
    [InlineData(10_000)]
    [InlineData(70_001)]
    public void Numbers_of_every_size_and_sign_are_put_in_order(int count)
    {
        var random = new Generator((ulong)count);
        double[] values = [.. Enumerable.Range(0, count).Select(i => i % 5 == 0 ? Math.Round(random.Normal()) : random.Normal() * Math.Pow(10, (i % 601) - 300))];
        double[] expected = [.. values.Order()];
        RisingOrder.Sort(values);
        Assert.Equal(expected, values);
        Assert.Contains(values, value => value < -1e200);
        Assert.Contains(values, value => Math.Abs(value) < 1e-200);
    }

    [Fact]
    public void Numbers_in_order_or_against_it_and_equal_ones_come_out_in_order()
    {
        foreach (var make in new Func<int, double>[] { i => i, i => -i, _ => -2.5, i => i % 2 == 0 ? double.MaxValue : double.MinValue })
        {
            double[] values = [.. Enumerable.Range(1, 20_000).Select(make)];
            double[] expected = [.. values.Order()];
            RisingOrder.Sort(values);
            Assert.Equal(expected, values);
        }
    }
}
