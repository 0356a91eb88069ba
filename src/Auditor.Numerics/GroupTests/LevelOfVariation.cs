using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>Within which classes a group's columns are constant.</summary>
public enum VariationLevel
{
    /// <summary>No column is constant within a declared class: the declared basis fits.</summary>
    Rows,

    /// <summary>All columns are constant within each period.</summary>
    Period,

    /// <summary>All columns are constant within each cluster.</summary>
    Cluster,

    /// <summary>All columns are constant within each unit.</summary>
    Unit,

    /// <summary>Some columns are constant within some class, but not all within one.</summary>
    Mixture,
}

/// <summary>
/// The form that the level on which a group varies asks for, whatever was declared: columns constant within period carry no more than T observations, so the form
/// over periods; constant within cluster or unit, the form over these; a mixture, the larger p of the two.
/// </summary>
/// <param name="Test">Null when the group varies over rows.</param>
/// <remarks>The project's own rule; its reasons are simulations of irrelevant series in panels. Constancy is exact equality of values as declared.</remarks>
public sealed record LevelOfVariation(VariationLevel Level, TestResult? Test)
{
    /// <returns>Null when no dependence is declared.</returns>
    public static LevelOfVariation? Of(AddedGroup group, GroupSums sums) => sums.Levels is LevelCounts counts
        ? Form(group, sums, group.Rank == 0 ? VariationLevel.Rows : Classify(counts))
        : null;

    private static VariationLevel Classify(LevelCounts counts)
    {
        bool All(int? constant) => constant == counts.Columns;
        return All(counts.ConstantWithinPeriod) ? VariationLevel.Period
            : All(counts.ConstantWithinCluster) ? VariationLevel.Cluster
            : All(counts.ConstantWithinUnit) ? VariationLevel.Unit
            : counts is { ConstantWithinPeriod: > 0 } or { ConstantWithinCluster: > 0 } or { ConstantWithinUnit: > 0 } ? VariationLevel.Mixture
            : VariationLevel.Rows;
    }

    private static LevelOfVariation Form(AddedGroup group, GroupSums sums, VariationLevel level) => new(level, level switch
    {
        VariationLevel.Period => PeriodF.Of(group, sums.Period!),
        VariationLevel.Cluster => ClusterF.Of(group, sums.Cluster!),
        VariationLevel.Unit => ClusterF.Of(group, sums.Unit!),
        VariationLevel.Mixture => LargerP(ByPeriod(group, sums), ByCluster(group, sums)),
        _ => null,
    });

    private static TestResult? ByPeriod(AddedGroup group, GroupSums sums) => sums.Period is ClassSums periods ? PeriodF.Of(group, periods) : null;

    private static TestResult? ByCluster(AddedGroup group, GroupSums sums) =>
        (sums.Cluster ?? sums.Unit) is ClassSums clusters ? ClusterF.Of(group, clusters) : null;

    /// <summary>The larger p; a form without a value leaves the mixture without one.</summary>
    private static TestResult? LargerP(TestResult? a, TestResult? b)
    {
        if (a is null || b is null)
        {
            return a ?? b;
        }

        return a is NotComputable || (b is not NotComputable && a.P >= b.P) ? a : b;
    }
}
