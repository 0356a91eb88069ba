using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of the declared structure of the rows: clusters, units, periods.</summary>
internal static class StructureFacts
{
    private const string NoTime = "no time order declared";

    private static readonly FactFamily<StructureCounts> Family = new FactFamily<StructureCounts>(About.Rows)
        .Flag("clusters_declared", "The declaration names a cluster column.", counts => counts.Clusters is not null)
        .Count("n_clusters", "clusters", "Clusters that have a row of the final model's fit.", counts => counts.Clusters, NoClusters)
        .Count("one_row_clusters", "clusters", "Clusters with one such row.", counts => counts.OneRowClusters, NoClusters)
        .Flag("every_cluster_has_one_row", "All clusters have one row.", counts => counts.Clusters is int clusters ? counts.OneRowClusters == clusters : null, NoClusters)
        .Number("largest_cluster_share", FactUnits.Share, "Rows of the largest cluster as a share of the rows used.", Largest, NoClusters)
        .Flag("units_declared", "The declaration names a unit column.", counts => counts.Units is not null)
        .Count("n_units", "units", "Units that have a row of the final model's fit.", counts => counts.Units, _ => "no unit declared")
        .Count("units_in_several_clusters", "units", "Units with rows in more than one cluster.", counts => counts.UnitsInSeveralClusters, NoUnitsOrClusters)
        .Number("units_in_several_clusters_share", FactUnits.Share, "Those units as a share of all.", counts => counts.Units > 0 ? (double?)counts.UnitsInSeveralClusters / counts.Units : null, NoUnitsOrClusters)
        .Flag("time_declared", "The declaration gives the rows an order in time.", counts => counts.Periods is not null)
        .Count("n_periods", "periods", "Periods that have a row of the final model's fit.", counts => counts.Periods, _ => NoTime)
        .Flag("days_as_periods", "Time holds dates and no period is declared: each distinct day is a period of its own.", counts => counts.Periods is null ? null : counts.DaysAsPeriods, _ => NoTime)
        .Flag("has_missing_periods", "A unit has no row in a period between its first and its last.", counts => counts.MissingPeriods is long missing ? missing > 0 : null, NotCounted)
        .Count("missing_periods", "periods", "Such periods, added up over the units.", counts => counts.MissingPeriods, NotCounted)
        .Flag("has_tied_rows", "Some rows share unit and period.", counts => counts.TiedRows is { } tied ? tied > 0 : null, _ => NoTime)
        .Count("tied_rows", FactUnits.Rows, "Rows that share unit and period with an earlier one.", counts => counts.TiedRows, _ => NoTime);

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static IEnumerable<KeyValuePair<string, FactValue>> Values(StructureCounts counts) => Family.From(counts, "", null).Values;

    private static double? Largest(StructureCounts counts) => counts.Rows > 0 ? (double?)counts.LargestCluster / counts.Rows : null;

    private static string NoClusters(StructureCounts counts) => "no cluster declared";

    private static string NoUnitsOrClusters(StructureCounts counts) => counts.Clusters is null ? "no cluster declared" : "no unit declared";

    private static string NotCounted(StructureCounts counts) => counts.Periods is null ? NoTime : "periods cannot be counted: dates without a declared period, or numbers that are not whole";
}
