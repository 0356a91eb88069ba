using Auditor.Numerics.Factor;
using Auditor.Numerics.Random;
using CsCheck;

namespace Auditor.Numerics.Tests.Factor;

/// <summary>Groups added last by halving against all others factored anew for each group.</summary>
public sealed class LastInTests
{
    private const double Tolerance = 1e-10;

    private static Gen<MatrixDesign> Design =>
        from rows in Gen.Int[6, 60]
        from sizes in Gen.Int[1, 4].Array[1, 9]
        from kinds in Gen.Int[0, 5].Array[36]
        from seed in Gen.Int
        select Made(rows, sizes, kinds, seed);

    /// <summary>Also with aliased columns and with more columns than rows.</summary>
    [Fact]
    public void Every_group_adds_what_it_adds_after_the_others_one_by_one() => Design.Sample(design =>
    {
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        int[][] groups = [.. design.Layout.Groups.Select(range => range.Indices.ToArray())];
        var last = LastIn.Of(final, groups);
        for (var g = 0; g < groups.Length; g++)
        {
            Same(AddedGroup.After(final, [.. groups.Where((_, other) => other != g).SelectMany(columns => columns)], groups[g]), last[g], final.Rss);
        }
    });

    [Fact]
    public void Threads_change_no_bit()
    {
        var design = Made(40, [2, 3, 1, 4, 2, 1, 3], new int[36], 4);
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        int[][] groups = [.. design.Layout.Groups.Select(range => range.Indices.ToArray())];
        Assert.Equal(LastIn.Of(final, groups).SelectMany(group => group.U), LastIn.Of(final, groups, threads: 5).SelectMany(group => group.U));
    }

    private static void Same(AddedGroup expected, AddedGroup actual, double rss)
    {
        Assert.Equal(expected.Kept, actual.Kept);
        Assert.Equal((expected.Rank, expected.RankBefore, expected.RankWith), (actual.Rank, actual.RankBefore, actual.RankWith));
        Assert.Equal(expected.SumOfSquares, actual.SumOfSquares, Tolerance * rss);
        Assert.Equal(expected.RssWith, actual.RssWith, Tolerance * rss);
        Assert.Empty(actual.Aliased);
    }

    private static MatrixDesign Made(int rows, int[] sizes, int[] kinds, int seed)
    {
        var (random, columns) = (new Generator((ulong)seed), new List<double[]>());
        double[] Fresh() => [.. Enumerable.Range(0, rows).Select(_ => (2 * random.Uniform()) - 1)];
        var x = Fresh();
        foreach (var kind in kinds.Take(sizes.Sum()))
        {
            columns.Add(kind switch
            {
                4 when columns.Count > 0 => columns[(int)(random.Uniform() * columns.Count)],
                5 => x,
                _ => Fresh(),
            });
        }

        var starts = sizes.Select((_, g) => sizes.Take(g).Sum());
        return new MatrixDesign(true, [x], [.. starts.Zip(sizes, (start, size) => columns.GetRange(start, size).ToArray())], Fresh());
    }
}
