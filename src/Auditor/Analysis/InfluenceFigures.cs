using Auditor.Data;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The rows that bear most on the final model's fit, as the record shows them.</summary>
internal static class InfluenceFigures
{
    private const int Shown = 10;

    /// <param name="label">The declared row label; null when there is none.</param>
    public static Influence Of(IReadOnlyList<RowInfluence> rows, RowSubset subset, DataColumn? label)
    {
        int Row(RowInfluence row) => subset.Rows[row.Position] + 1;
        var largest = rows.Where(row => row.CooksDistance is not null).OrderByDescending(row => row.CooksDistance).ThenBy(row => row.Position).Take(Shown);
        return new Influence(
            [.. rows.Where(row => row.HasLeverageOne).Select(Row)],
            [.. largest.Select(row => new InfluentialRow(
                Row(row), label?.Text(subset.Rows[row.Position]), row.Leverage, row.StudentisedResidual, row.CooksDistance, row.Dffits))])
        {
            Why = rows.Count == 0 ? "the final model leaves no residuals: it fits to rounding, or no degrees of freedom are left" : null,
        };
    }
}
