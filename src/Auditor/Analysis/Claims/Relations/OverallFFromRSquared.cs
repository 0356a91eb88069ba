using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>F = [R² / (r - i)] / [(1 - R²) / (n - r)]; from adjusted R² where R² is not printed. Holds for the classical F only.</summary>
internal static class OverallFFromRSquared
{
    public static IEnumerable<ClaimRelation> Of(ReportedFit fit)
    {
        if (fit.Figures.F is not { } f || fit.Df is not double df || fit.Terms <= 0 || fit.OtherForm(f))
        {
            yield break;
        }

        var claimed = Interval.Of(f.Printed, 0, double.PositiveInfinity);
        double FOf(double r) => r >= 1 ? double.PositiveInfinity : Math.Max(0, r) / fit.Terms / ((1 - r) / df);
        if (fit.RSquared is { } rSquared)
        {
            yield return Relation.Of(f, claimed, [fit.Figures.RSquared, fit.Figures.Rows], rSquared.Rising(FOf), "F of the whole model follows from R², the rows and the number of coefficients");
        }
        else if (fit.Adjusted is { } adjusted)
        {
            var factor = df / (fit.Rows!.Value - fit.Intercepts);
            yield return Relation.Of(
                f, claimed, [fit.Figures.AdjustedRSquared, fit.Figures.Rows], adjusted.Rising(a => FOf(1 - ((1 - a) * factor))), "F of the whole model follows from adjusted R², the rows and the number of coefficients");
        }
    }
}
