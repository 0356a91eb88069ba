using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>What must be fed with all rows in one sequence: pictures, sums by cluster, unit and period.</summary>
internal sealed class OrderedSums(
    FinalFactor final, IReadOnlyList<AddedGroup> groups, IReadOnlyList<IAccumulator> others, DependenceStructure? structure)
{
    private DependencePass? _dependence;

    public bool IsEmpty => others.Count == 0 && structure is null;

    /// <param name="raw">The block as declared.</param>
    public void Add(RowBlock raw, ResidualBlock block)
    {
        if (structure is not null)
        {
            _dependence ??= new DependencePass(final, groups, structure, raw.Stride);
            _dependence.Add(raw, block);
        }

        foreach (var other in others)
        {
            other.Add(block);
        }
    }

    public void Finish(IDesignRows rows, IReadOnlyList<GroupSums> into) => _dependence?.Finish(rows, into);
}
