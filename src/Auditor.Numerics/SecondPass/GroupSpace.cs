namespace Auditor.Numerics.SecondPass;

/// <summary>What one thread needs to work on the groups of a block in turn; kept small, so that it stays in the cache.</summary>
/// <param name="capacity">Most rows of a block.</param>
/// <param name="threads">Most threads for the sums of a large group, each of which is computed by itself.</param>
internal sealed class GroupSpace(int capacity, int threads)
{
    /// <summary>Sums of smaller groups are not worth a thread.</summary>
    private const int LargeRank = 64;

    private readonly Dictionary<int, GroupRows> _rows = [];
    private readonly (double[] Weights, WeightedProducts Products)[] _sums =
        [.. Enumerable.Range(0, GroupAccumulator.Sums).Select(_ => (new double[capacity], new WeightedProducts(capacity)))];

    /// <summary>1 - h(F + group) of each row.</summary>
    public double[] Complements { get; } = new double[capacity];

    /// <summary>Copies of each row, 0 for one that is left out.</summary>
    public double[] Alive { get; } = new double[capacity];

    public GroupRows Rows(int rank)
    {
        if (!_rows.TryGetValue(rank, out var rows))
        {
            _rows[rank] = rows = new GroupRows(rank, capacity);
        }

        return rows;
    }

    /// <summary>Does each of the sums, with room for its weights.</summary>
    public void EachSum(int rank, Action<int, double[], WeightedProducts> work)
    {
        if (threads > 1 && rank >= LargeRank)
        {
            Parallel.For(0, _sums.Length, new ParallelOptions { MaxDegreeOfParallelism = threads }, at => work(at, _sums[at].Weights, _sums[at].Products));
            return;
        }

        // One after the other they can share what is in the cache.
        for (var at = 0; at < _sums.Length; at++)
        {
            work(at, _sums[0].Weights, _sums[0].Products);
        }
    }
}
