using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>The second and last pass over the rows: with the factor known, everything that needs residuals is summed at once.</summary>
public static class RowPass
{
    /// <param name="others">Further accumulators, fed with the same blocks.</param>
    public static RowPassResult Run(
        IDesignRows design, FinalFactor final, IReadOnlyList<AddedGroup> groups, IReadOnlyList<IAccumulator> others)
    {
        var refinement = new Refinement(final);
        ResidualBlock? residuals = null;
        GroupAccumulator[] accumulators = [];
        foreach (var block in design.Blocks())
        {
            if (residuals is null)
            {
                residuals = new ResidualBlock(final, block.Stride);
                accumulators = [.. groups.Select(group => new GroupAccumulator(group, block.Stride))];
            }

            refinement.Add(block);
            residuals.Load(block, refinement.Residuals);
            foreach (var accumulator in accumulators.Concat(others))
            {
                accumulator.Add(residuals);
            }
        }

        return new RowPassResult(refinement.Finish(), [.. accumulators.Select(accumulator => accumulator.Sums)]);
    }
}

/// <param name="Groups">Sums of each group, in the order given.</param>
public sealed record RowPassResult(RefinedCoefficients Coefficients, IReadOnlyList<GroupSums> Groups);
