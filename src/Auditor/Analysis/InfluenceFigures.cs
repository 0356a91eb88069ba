using Auditor.Data;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The rows that bear most on the final model's fit, as the record shows them.</summary>
internal static class InfluenceFigures
{
    /// <summary>Rows shown, largest Cook's distance first.</summary>
    public const int Shown = 10;

    /// <param name="label">The declared row label; null when there is none.</param>
    public static Influence Of(InfluenceSummary summary, RowSubset subset, DataColumn? label)
    {
        int Row(int position) => subset[position] + 1;
        return new Influence(
            [.. summary.LeverageOne.Select(Row)],
            [.. summary.Largest.Select(row => new InfluentialRow(
                Row(row.Position), label?.Text(subset[row.Position]), row.Leverage, row.StudentisedResidual, row.CooksDistance, row.Dffits))])
        {
            Why = summary.HasResiduals ? null : "the final model leaves no residuals: it fits to rounding, or no degrees of freedom are left",
        };
    }
}
