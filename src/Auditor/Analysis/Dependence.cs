using Auditor.Design;
using Auditor.Numerics.SecondPass;

namespace Auditor.Analysis;

/// <summary>The declared dependence between the rows of one row set, and what the tests that allow for it are told besides.</summary>
/// <param name="Rows">Codes for the second pass; null when nothing is declared.</param>
/// <param name="SerialLag">The declared lag of the Newey–West covariance; null: by rule.</param>
/// <param name="Seed">Seed of the run, from which every group's stream is made.</param>
internal sealed record Dependence(DependenceStructure? Rows, int? SerialLag, long Seed)
{
    /// <summary>The column that names the cluster; null when none is declared.</summary>
    public string? ClusteredBy { get; init; }

    /// <summary>The column that names the unit; null likewise.</summary>
    public string? Unit { get; init; }

    public bool Clustered => Rows?.Cluster is not null;

    public bool Timed => Rows?.Period is not null;

    /// <summary>The same with room for so many doubles of sums by class; null: as it is.</summary>
    public Dependence Within(long? mostDoubles) =>
        Rows is null || mostDoubles is not long most ? this : this with { Rows = Rows with { MostDoubles = most } };

    public static Dependence Of(BoundStructure bound, RowStructure structure, long seed)
    {
        var (clusters, units) = (structure.Clusters, structure.Units);
        if (clusters is null && units is null && structure.Periods is null)
        {
            return new Dependence(null, null, seed);
        }

        // One column that is both unit and cluster is summed once.
        var cluster = clusters?.Classes;
        var unit = clusters is not null && units?.Name == clusters.Name ? cluster : units?.Classes;
        return new Dependence(new DependenceStructure { Cluster = cluster, Unit = unit, Period = structure.Periods?.Classes }, bound.SerialLag, seed)
        {
            ClusteredBy = clusters?.Name,
            Unit = units?.Name,
        };
    }
}
