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
            structure.Order?.TiedRows);
    }
}
