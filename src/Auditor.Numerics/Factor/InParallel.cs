using System.Collections.Concurrent;

namespace Auditor.Numerics.Factor;

/// <summary>Pieces of work handed out in order.</summary>
internal static class InParallel
{
    /// <summary>Does the work for 0 to count - 1; a thread takes the next one as soon as it is free.</summary>
    public static void Each(int count, int threads, Action<int> work)
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
