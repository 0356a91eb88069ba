using System.Collections.Concurrent;

namespace Auditor.Numerics.Factor;

/// <summary>Builds the factor of a design in one pass over its rows.</summary>
public static class FactorBuilder
{
    /// <param name="threads">Most stripes of rows to work on at once; no bit of the result depends on it.</param>
    /// <exception cref="ArgumentException">The design has no rows.</exception>
    public static OrthogonalFactor Build(IDesignRows design, int threads = 1)
    {
        var factor = BuildPlain(design, threads);
        return design.Extended is { } extended && PreciseFactor.IsWanted(factor) ? PreciseFactor.Build(extended, factor) : factor;
    }

    private static OrthogonalFactor BuildPlain(IDesignRows design, int threads)
    {
        var (shifts, stripes) = (Shifts(design), new StripeFactor[design.Stripes]);
        Each(stripes.Length, threads, stripe => stripes[stripe] = new StripeFactor(design.Layout, shifts).AddAll(design.Blocks(stripe)));
        foreach (var stripe in stripes.Skip(1))
        {
            stripes[0].Merge(stripe);
        }

        return stripes[0].Finish();
    }

    /// <summary>The first row's values when there is an intercept, which keeps its own.</summary>
    private static double[] Shifts(IDesignRows design)
    {
        var shifts = new double[design.Layout.Columns];
        if (design.Layout.Intercept && design.Blocks(0).FirstOrDefault(block => block.Rows > 0) is { } first)
        {
            for (var c = 1; c < shifts.Length; c++)
            {
                shifts[c] = first.Column(c)[0];
            }
        }

        return shifts;
    }

    /// <summary>Does the work for 0 to count - 1; a thread takes the next one as soon as it is free.</summary>
    private static void Each(int count, int threads, Action<int> work)
    {
        if (threads <= 1 || count == 1)
        {
            for (var at = 0; at < count; at++)
            {
                work(at);
            }

            return;
        }

        Parallel.ForEach(
            Partitioner.Create(Enumerable.Range(0, count), EnumerablePartitionerOptions.NoBuffering),
            new ParallelOptions { MaxDegreeOfParallelism = threads },
            work);
    }
}
