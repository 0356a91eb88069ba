using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>The second and last pass over the rows: with the factor known, everything that needs residuals is summed at once.</summary>
public static class RowPass
{
    /// <param name="others">Further accumulators, fed with the same blocks.</param>
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
        DependencePass? dependence = null;
        var refinement = new Refinement(final);
        ResidualBlock? residuals = null;
        GroupAccumulator[] accumulators = [];
        var rows = final.Factor.IsExtended ? design.Extended ?? design : design;
        foreach (var block in rows.Blocks())
        {
            if (residuals is null)
            {
                residuals = new ResidualBlock(final, block.Stride);
                accumulators = [.. groups.Select(group => new GroupAccumulator(group, block.Stride, threads))];
                dependence = structure is null ? null : new DependencePass(final, groups, structure, block.Stride);
            }

            refinement.Add(block);
            residuals.Load(block, refinement.Residuals);
            foreach (var accumulator in accumulators.Concat(others))
            {
                accumulator.Add(residuals);
            }

            dependence?.Add(block, residuals);
        }

        GroupSums[] sums = [.. accumulators.Select(accumulator => accumulator.Finish())];
        dependence?.Finish(rows, sums);
        return new RowPassResult(refinement.Finish(), sums);
    }
}

/// <param name="Groups">Sums of each group, in the order given.</param>
public sealed record RowPassResult(RefinedCoefficients Coefficients, IReadOnlyList<GroupSums> Groups);
