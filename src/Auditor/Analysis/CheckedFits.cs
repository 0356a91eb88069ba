using Auditor.Design;
using Auditor.Numerics.ResidualChecks;

namespace Auditor.Analysis;

/// <summary>The final model's fit with its residuals, as the checks want it.</summary>
internal static class CheckedFits
{
    public static CheckedFit Of(BoundModel model, RowSetFit rows, ResidualStore residuals, bool sampling, int threads = 1) =>
        new(new DesignRows(model, new DesignPlan(model, []), rows.Rows), rows.Final, rows.Fit, residuals, sampling, threads);
}
