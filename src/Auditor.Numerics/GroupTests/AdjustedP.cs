namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Adjusted p-values of a family of m tests. Null of each: that group's own. A group without a p is not of the family. Worked on natural
/// logs, so that p-values below the least double keep their order.
/// </summary>
/// <remarks>
/// Holm 1979, Scandinavian Journal of Statistics 6; Hochberg 1988, Biometrika 75; Benjamini and Hochberg 1995, JRSS B 57 (false discovery rate,
/// independence or positive dependence); Benjamini and Yekutieli 2001, Annals of Statistics 29 (any dependence). Verified against R's p.adjust
/// (tests/reference).
/// </remarks>
public static class AdjustedP
{
    /// <summary>Family-wise, any dependence: running maximum of (m - i + 1) p_(i).</summary>
    public static double[] Holm(IReadOnlyList<double> logP) => StepDown(logP, (m, rank) => m - rank + 1);

    /// <summary>Family-wise, independence or positive dependence: running minimum, from the largest, of (m - i + 1) p_(i).</summary>
    public static double[] Hochberg(IReadOnlyList<double> logP) => StepUp(logP, (m, rank) => m - rank + 1);

    public static double[] BenjaminiHochberg(IReadOnlyList<double> logP) => StepUp(logP, (m, rank) => (double)m / rank);

    public static double[] BenjaminiYekutieli(IReadOnlyList<double> logP)
    {
        var harmonic = Enumerable.Range(1, logP.Count).Sum(i => 1.0 / i);
        return StepUp(logP, (m, rank) => harmonic * m / rank);
    }

    private static double[] StepDown(IReadOnlyList<double> logP, Func<int, int, double> factor)
    {
        var (adjusted, worst) = (new double[logP.Count], double.NegativeInfinity);
        foreach (var (index, rank) in Ascending(logP))
        {
            worst = Math.Max(worst, logP[index] + Math.Log(factor(logP.Count, rank)));
            adjusted[index] = Math.Min(0, worst);
        }

        return adjusted;
    }

    private static double[] StepUp(IReadOnlyList<double> logP, Func<int, int, double> factor)
    {
        var (adjusted, best) = (new double[logP.Count], 0.0);
        foreach (var (index, rank) in Ascending(logP).Reverse())
        {
            best = Math.Min(best, logP[index] + Math.Log(factor(logP.Count, rank)));
            adjusted[index] = best;
        }

        return adjusted;
    }

    private static IEnumerable<(int Index, int Rank)> Ascending(IReadOnlyList<double> logP) =>
        Enumerable.Range(0, logP.Count).OrderBy(i => logP[i]).Select((index, position) => (index, position + 1));
}
