using Auditor.Data;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>All residual checks of the final model in the record's order; one that cannot be made says why.</summary>
internal static class ResidualCheckFigures
{
    public static IReadOnlyList<CheckResult> Of(
        CheckedFit fit, InfluenceSummary influence, SerialInputs serial, RowSubset rows, double significance, long seed)
    {
        var figure = new CheckFigure(rows, significance);
        return
        [
            figure.Of("breusch_pagan", Assumptions.EqualVariance, BreuschPagan.Studentised(fit)),
            figure.Of("breusch_pagan_original", Assumptions.EqualVariance, BreuschPagan.Original(fit)),
            figure.Of("white", Assumptions.EqualVariance, White.Of(fit)),
            figure.Of("jarque_bera", Assumptions.Normality, JarqueBera.Of(fit, (ulong)seed)),
            figure.Of("shapiro_wilk", Assumptions.Normality, ShapiroWilk.Of(fit)),
            figure.Of("anderson_darling", Assumptions.Normality, AndersonDarling.Of(fit)),
            .. SerialCheckFigures.OfOrder(fit, serial, figure),
            figure.Of("reset", Assumptions.Form, Reset.Of(fit)),
            figure.Of("largest_residual", Assumptions.NoOutlier, LargestResidual.Of(fit, influence)),
            SerialCheckFigures.OfSplit(fit, serial, figure),
        ];
    }
}
