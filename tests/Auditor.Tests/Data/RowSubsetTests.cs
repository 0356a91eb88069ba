using Auditor.Data;
using Auditor.Numerics.Random;
using CsCheck;

namespace Auditor.Tests.Data;

/// <summary>Rows kept as bits behave as the rising list that they stand for.</summary>
public sealed class RowSubsetTests
{
    private static readonly Gen<(int Rows, double Share)> _sizes = Gen.Select(Gen.Int[1, 20_000], Gen.OneOf(Gen.Const(0.0), Gen.Const(0.001), Gen.Const(0.5), Gen.Const(0.999), Gen.Const(1.0)));

    [Fact]
    public void Positions_runs_and_order_are_those_of_the_list()
    {
        Gen.Select(_sizes, Gen.Int[0, 1 << 20]).Sample((size, seed) =>
        {
            var list = List(size.Rows, size.Share, seed);
            var subset = new RowSubset(list);
            Assert.Equal(list.Length, subset.Count);
            Assert.Equal(list, subset);
            for (var first = 0; first < list.Length; first += 1 + (list.Length / 7))
            {
                Assert.Equal(list[first], subset[first]);
                var run = new int[Math.Min(300, list.Length - first)];
                subset.CopyTo(first, run);
                Assert.Equal(list.AsSpan(first, run.Length).ToArray(), run);
            }
        });
    }

    [Fact]
    public void Taking_rows_away_is_taking_them_off_the_list()
    {
        Gen.Select(_sizes, Gen.Int[0, 1 << 20]).Sample((size, seed) =>
        {
            var (list, other) = (List(size.Rows, size.Share, seed), List(size.Rows, 0.3, seed + 1));
            var gone = new RowBits(size.Rows);
            Array.ForEach(other, gone.Set);
            Assert.Equal(list.Except(other), Bits(size.Rows, list).Without(gone));
        });
    }

    [Fact]
    public void Subsets_are_equal_when_their_rows_are()
    {
        var (all, made) = (RowSubset.All(130), Bits(130, [.. Enumerable.Range(0, 130)]));
        Assert.Equal(all, made);
        Assert.Equal(all.GetHashCode(), made.GetHashCode());
        Assert.NotEqual(all, Bits(130, [.. Enumerable.Range(0, 129)]));
        Assert.Same(all, all.Without(new RowBits(130)));
    }

    private static int[] List(int rows, double share, int seed)
    {
        var random = new Generator((ulong)seed);
        return [.. Enumerable.Range(0, rows).Where(_ => random.Uniform() < share)];
    }

    private static RowSubset Bits(int tableRows, int[] rows)
    {
        var bits = new RowBits(tableRows);
        Array.ForEach(rows, bits.Set);
        return new RowSubset(bits);
    }
}
