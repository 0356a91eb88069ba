using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>The second and last pass over the rows: with the factor known, everything that needs residuals is summed at once.</summary>
public static class RowPass
{
    /// <param name="others">Further accumulators, fed with the same blocks; those that are no <see cref="IMergeable"/> in the order of the rows.</param>
    /// <param name="structure">
    /// The declared dependence between rows; nothing is computed for what is absent. When the sums by class do not fit in memory, the rows are
    /// passed more than once.
    /// </param>
    /// <param name="threads">Most threads to use; no result depends on it.</param>
    public static RowPassResult Run(
        IDesignRows design,
        FinalFactor final,
        IReadOnlyList<AddedGroup> groups,
        IReadOnlyList<IAccumulator> others,
        DependenceStructure? structure = null,
        int threads = 1)
    {
        var rows = final.Factor.IsExtended ? design.Extended ?? design : design;
        IMergeable[] mergeable = [.. others.OfType<IMergeable>()];
        var ordered = new OrderedSums(final, groups, [.. others.Where(other => other is not IMergeable)], structure);
        var (stripes, inside) = (rows.Stripes, rows.Stripes > 1 ? 1 : threads);
        var merged = new OrderedMerge<StripeSums>(stripes, (first, next) => first.Merge(next));

        // One thread takes the stripes in order. With more, what needs the rows in one sequence is a piece of work like a stripe, and the longest: it begins first.
        var inSequence = stripes == 1 || threads <= 1;
        var extra = ordered.IsEmpty || inSequence ? 0 : 1;
        InParallel.Each(stripes + extra, threads, piece =>
        {
            if (piece < extra)
            {
                Feed(final, rows.Blocks(), null, ordered);
                return;
            }

            var sums = new StripeSums(final, groups, mergeable, inside);
            Feed(final, stripes == 1 ? rows.Blocks() : rows.Blocks(piece - extra), sums, inSequence ? ordered : null);
            merged.Take(piece - extra, sums);
        });
        var all = merged.Merged!;
        all.HandOver(mergeable);
        var groupSums = all.Finish();
        ordered.Finish(rows, groupSums);
        return new RowPassResult(all.Refinement.Finish(), groupSums);
    }

    private static void Feed(FinalFactor final, IEnumerable<RowBlock> blocks, StripeSums? sums, OrderedSums? ordered)
    {
        var refinement = sums?.Refinement ?? new Refinement(final);
        ResidualBlock? residuals = null;
        foreach (var block in blocks)
        {
            residuals ??= new ResidualBlock(final, block.Stride);
            refinement.Add(block);
            residuals.Load(block, refinement.Residuals);
            sums?.Add(residuals);
            ordered?.Add(block, residuals);
        }
    }
}

/// <param name="Groups">Sums of each group, in the order given.</param>
public sealed record RowPassResult(RefinedCoefficients Coefficients, IReadOnlyList<GroupSums> Groups);
