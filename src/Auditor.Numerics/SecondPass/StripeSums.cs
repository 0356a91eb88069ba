using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>All that is summed over one stripe of rows; stripes are merged in order.</summary>
internal sealed class StripeSums
{
    private readonly IReadOnlyList<AddedGroup> _groups;
    private readonly IMergeable[] _others;
    private readonly int _threads;
    private GroupAccumulator[] _accumulators = [];

    /// <param name="others">What is summed is put into a fork of each.</param>
    /// <param name="threads">For the sums of large groups.</param>
    public StripeSums(FinalFactor final, IReadOnlyList<AddedGroup> groups, IEnumerable<IMergeable> others, int threads)
    {
        (_groups, _threads) = (groups, threads);
        Refinement = new Refinement(final);
        _others = [.. others.Select(other => other.Fork())];
    }

    public Refinement Refinement { get; }

    public void Add(ResidualBlock block)
    {
        if (_accumulators.Length < _groups.Count)
        {
            var space = new GroupSpace(block.Capacity, _threads);
            _accumulators = [.. _groups.Select(group => new GroupAccumulator(group, space))];
        }

        foreach (var accumulator in _accumulators)
        {
            accumulator.Add(block);
        }

        foreach (var other in _others)
        {
            other.Add(block);
        }
    }

    /// <summary>Takes in the sums over the rows that follow.</summary>
    public void Merge(StripeSums next)
    {
        Refinement.Merge(next.Refinement);
        if (_accumulators.Length == 0)
        {
            _accumulators = next._accumulators;
        }
        else
        {
            MergeGroups(next._accumulators);
        }

        for (var at = 0; at < _others.Length; at++)
        {
            _others[at].Merge(next._others[at]);
        }
    }

    /// <param name="next">None of a stripe without rows.</param>
    private void MergeGroups(GroupAccumulator[] next)
    {
        for (var g = 0; g < next.Length; g++)
        {
            _accumulators[g].Merge(next[g]);
        }
    }

    /// <summary>Puts the further sums where they were asked for.</summary>
    public void HandOver(IReadOnlyList<IMergeable> others)
    {
        for (var at = 0; at < _others.Length; at++)
        {
            others[at].Merge(_others[at]);
        }
    }

    public GroupSums[] Finish() => [.. _accumulators.Select(accumulator => accumulator.Finish())];
}
