using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Effective number of clusters for a group: C / (1 + G), G the squared coefficient of variation over the clusters of gamma_c, a cluster's share in the
/// variance of u under errors of equal variance that within a cluster are uncorrelated (gamma_c = sum |qz_i|²) or perfectly correlated (gamma_c = |sum qz_i|²).
/// Equals C when all clusters weigh alike. For a group of several directions gamma_c is summed over them.
/// </summary>
/// <param name="Uncorrelated">Correlation 0 within clusters.</param>
/// <param name="Correlated">Correlation 1; null when the sums of qz vanish in every cluster, as they do when the final model holds a constant for each.</param>
/// <remarks>
/// Carter, Schnepel and Steigerwald 2017, Review of Economics and Statistics 99 (from memory); summing over directions is the project's own.
/// Verified by brute force.
/// </remarks>
public sealed record EffectiveClusters(double Uncorrelated, double? Correlated)
{
    /// <summary>A share below this, squared rows of qz adding up to q, is rounding.</summary>
    private const double Zero = 1e-20;

    /// <returns>Null when the group adds no direction.</returns>
    public static EffectiveClusters? Of(AddedGroup group, ClassSums clusters) => group.Rank == 0
        ? null
        : new EffectiveClusters(Number(clusters, clusters.Squares)!.Value, Number(clusters, clusters.SumSquares));

    private static double? Number(ClassSums clusters, Func<int, double> share)
    {
        var shares = Enumerable.Range(0, clusters.Count).Select(share).ToArray();
        var total = shares.Sum();
        return total > Zero ? total * total / shares.Sum(value => value * value) : null;
    }
}
