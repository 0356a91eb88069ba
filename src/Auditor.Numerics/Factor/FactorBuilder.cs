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
        var (shifts, count) = (Shifts(design), design.Stripes);
        var factor = new OrderedMerge<StripeFactor>(count, (first, next) => first.Merge(next));
        InParallel.Each(count, threads, stripe => factor.Take(stripe, new StripeFactor(design.Layout, shifts).AddAll(design.Blocks(stripe))));
        return factor.Merged!.Finish();
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
}
