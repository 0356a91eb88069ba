namespace Auditor.Results;

/// <summary>What the declared structure amounts to on the final model's rows. Null: not declared.</summary>
/// <param name="LargestCluster">Rows of the largest cluster.</param>
/// <param name="OneRowClusters">Clusters with one row.</param>
/// <param name="Periods">Observed periods.</param>
/// <param name="MissingPeriods">Periods without a row between the first and the last of each unit, added up; null also when periods cannot be counted.</param>
/// <param name="TiedRows">Rows that share unit and period with an earlier one.</param>
public sealed record StructureCounts(
    int Rows, int? Clusters, int? LargestCluster, int? OneRowClusters, int? Units, int? Periods, long? MissingPeriods, int? TiedRows)
{
    /// <summary>Units with rows in more than one cluster; null unless both are declared.</summary>
    public int? UnitsInSeveralClusters { get; init; }

    /// <summary>Time holds dates and no period is declared: each distinct day is a period of its own.</summary>
    public bool DaysAsPeriods { get; init; }
}
