using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Elimination;

/// <summary>Where on the circle of responses a rule ends in the reported model, by any path.</summary>
internal sealed class SelectionEvent(OrthogonalFactor factor, Candidates candidates, DroppingRule rule)
{
    /// <summary>The intervals of tan theta in which it does; empty when it does not at the observed one, where it is known to: then rounding decides.</summary>
    /// <param name="grid">Ascending; holds the observed tangent.</param>
    public IReadOnlyList<TangentInterval> On(ResponseCircle circle, double[] grid)
    {
        var submodels = new Submodels(factor, candidates, circle.Parts);
        bool Inside(double tangent) => EndsInReported(submodels, tangent);
        if (!Inside(circle.Tangent))
        {
            return [];
        }

        var (found, from) = (new List<TangentInterval>(), Inside(grid[0]) ? 0 : (double?)null);
        for (var i = 1; i < grid.Length; i++)
        {
            var inside = Inside(grid[i]);
            if (inside != (from is not null))
            {
                var end = End(Inside, grid[i - 1], grid[i], inside);
                if (from is double start)
                {
                    found.Add(new TangentInterval(start, end));
                }

                from = inside ? end : null;
            }
        }

        return from is double last ? [.. found, new TangentInterval(last, double.PositiveInfinity)] : found;
    }

    /// <summary>Bisection to the last bit: between the two the rule's end changes (once, as far as the grid shows).</summary>
    private static double End(Func<double, bool> inside, double low, double high, bool atHigh)
    {
        while (low + ((high - low) / 2) is var middle && middle > low && middle < high)
        {
            (low, high) = inside(middle) == atHigh ? (low, middle) : (middle, high);
        }

        return low;
    }

    /// <summary>A unit that the reported model keeps is never dropped on the way to it, so a path that drops one is not followed further.</summary>
    private bool EndsInReported(Submodels submodels, double tangent)
    {
        Span<double> t = stackalloc double[3];
        ResponseCircle.At(tangent, t);
        var set = candidates.All;
        while (rule.Next(submodels[set], candidates, t) is int unit)
        {
            if (!candidates.Units[unit].LeftOut)
            {
                return false;
            }

            set = set.Without(unit);
        }

        return set == candidates.Reported;
    }
}
