namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Adjusted p-values of a family of m tests. Null of each: that group's own. A group without a p is not of the family. p-values carry
/// their logarithms, so that those below the least double keep their order.
/// </summary>
/// <remarks>
/// Holm 1979, Scandinavian Journal of Statistics 6; Hochberg 1988, Biometrika 75; Benjamini and Hochberg 1995, JRSS B 57 (false discovery rate,
/// independence or positive dependence); Benjamini and Yekutieli 2001, Annals of Statistics 29 (any dependence). Verified against R's p.adjust
/// (tests/reference).
/// </remarks>
public static class AdjustedP
{
    /// <summary>Family-wise, any dependence: running maximum of (m - i + 1) p_(i).</summary>
    public static PValue[] Holm(IReadOnlyList<PValue> p) => StepDown(p, (m, rank) => m - rank + 1);

    /// <summary>Family-wise, independence or positive dependence: running minimum, from the largest, of (m - i + 1) p_(i).</summary>
    public static PValue[] Hochberg(IReadOnlyList<PValue> p) => StepUp(p, (m, rank) => m - rank + 1);

    public static PValue[] BenjaminiHochberg(IReadOnlyList<PValue> p) => StepUp(p, (m, rank) => (double)m / rank);

    public static PValue[] BenjaminiYekutieli(IReadOnlyList<PValue> p)
    {
        var harmonic = Enumerable.Range(1, p.Count).Sum(i => 1.0 / i);
        return StepUp(p, (m, rank) => harmonic * m / rank);
    }

    private static PValue[] StepDown(IReadOnlyList<PValue> p, Func<int, int, double> factor)
    {
        var (adjusted, worst) = (new PValue[p.Count], new PValue(0, double.NegativeInfinity));
        foreach (var (index, rank) in Ascending(p))
        {
            worst = PValue.Larger(worst, p[index].Times(factor(p.Count, rank)));
            adjusted[index] = worst;
        }

        return adjusted;
    }

    private static PValue[] StepUp(IReadOnlyList<PValue> p, Func<int, int, double> factor)
    {
        var (adjusted, best) = (new PValue[p.Count], new PValue(1, 0));
        foreach (var (index, rank) in Ascending(p).Reverse())
        {
            best = PValue.Smaller(best, p[index].Times(factor(p.Count, rank)));
            adjusted[index] = best;
        }

        return adjusted;
    }

    private static IEnumerable<(int Index, int Rank)> Ascending(IReadOnlyList<PValue> p) =>
        Enumerable.Range(0, p.Count).OrderBy(i => p[i].Log).Select((index, position) => (index, position + 1));
}
