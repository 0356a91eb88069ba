namespace Auditor.Numerics.Factor;

/// <summary>Which combination of earlier columns an aliased column equals.</summary>
internal static class Combinations
{
    /// <summary>A part that moves the column by less than this, relative to its length, is rounding.</summary>
    private const double Negligible = 1e-9;

    public static AliasedColumn OfFinalColumn(FinalFactor final, int column)
    {
        // Only the columns kept before it can take part: later pivot rows are not yet in use.
        var earlier = final.Kept.Count(kept => kept < column);
        var coefficients = final.Explained(column)[..earlier].ToArray();
        Triangle.Solve(final.Triangle, coefficients);
        return Clean(final.Factor, column, [.. final.Kept.Take(earlier).Zip(coefficients, (kept, value) => new CombinationPart(kept, value))]);
    }

    /// <param name="coordinates">The column's coordinates orthogonal to F, rotated as the group's kept columns are.</param>
    public static AliasedColumn OfGroupColumn(AddedGroup group, int column, ReadOnlySpan<double> coordinates)
    {
        var earlier = group.Kept.Count(kept => kept < column);
        var own = coordinates[..earlier].ToArray();
        Triangle.Solve(group.Triangle, own);
        var explained = group.Final.Explained(column).ToArray();
        for (var k = 0; k < earlier; k++)
        {
            BlockKernels.AddScaled(explained, -own[k], group.Final.Explained(group.Kept[k]));
        }

        Triangle.Solve(group.Final.Triangle, explained);
        return Clean(
            group.Final.Factor,
            column,
            [
                .. group.Final.Kept.Zip(explained, (kept, value) => new CombinationPart(kept, value)),
                .. group.Kept.Take(earlier).Zip(own, (kept, value) => new CombinationPart(kept, value)),
            ]);
    }

    private static AliasedColumn Clean(OrthogonalFactor factor, int column, IReadOnlyList<CombinationPart> parts)
    {
        // A column that hardly varies is measured by its size: what is left of it is rounding.
        var size = Math.Max(factor.Lengths[column], 1e-6 * factor.LargestValues[column] * Math.Sqrt(factor.Totals.SumOfWeights));
        var constant = factor.Shifts[column];
        var kept = new List<CombinationPart>();
        foreach (var part in parts)
        {
            if (factor.Layout.Intercept && part.Column == 0)
            {
                constant += part.Coefficient;
            }
            else if (Math.Abs(part.Coefficient) * factor.Lengths[part.Column] > Negligible * size)
            {
                constant -= part.Coefficient * factor.Shifts[part.Column];
                kept.Add(part);
            }
        }

        return new AliasedColumn(column, Math.Abs(constant) > Negligible * factor.LargestValues[column] ? constant : 0, kept);
    }
}
