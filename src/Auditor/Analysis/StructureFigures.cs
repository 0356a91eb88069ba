using Auditor.Data;
using Auditor.Design;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Counts what the declared structure amounts to on the rows of a fit.</summary>
internal static class StructureFigures
{
    public static StructureCounts Of(BoundModel model, RowSubset rows)
    {
        var structure = model.Structure.Among(rows);
        var sizes = structure.Clusters?.Sizes();
        return new StructureCounts(
            rows.Count,
            sizes?.Length,
            sizes?.Max(),
            sizes?.Count(size => size == 1),
            structure.Units?.Count,
            structure.Periods?.Count,
            structure.Order?.MissingPeriods,
            structure.Order?.TiedRows)
        {
            UnitsInSeveralClusters = structure is { Units: { } units, Clusters: { } clusters } ? InSeveral(units, clusters) : null,
            DaysAsPeriods = model.Structure.Time is { Column: DateColumn, Steps: null },
        };
    }

    /// <summary>Units with rows in more than one cluster.</summary>
    private static int InSeveral(RowGroups units, RowGroups clusters)
    {
        var (first, several) = (new int[units.Count], new bool[units.Count]);
        Array.Fill(first, -1);
        for (var row = 0; row < units.Codes.Count; row++)
        {
            var (unit, cluster) = (units.Codes[row], clusters.Codes[row]);
            several[unit] |= first[unit] >= 0 && first[unit] != cluster;
            first[unit] = cluster;
        }

        return several.Count(one => one);
    }
}
