using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>Adjusted R² = 1 - (1 - R²) (n - i) / (n - r), i = 1 with an intercept; without n it is only at most R².</summary>
internal static class AdjustedFromRSquared
{
    public static IEnumerable<ClaimRelation> Of(ReportedFit fit)
    {
        if (fit.Figures.AdjustedRSquared is not { } adjusted || fit.RSquared is not { } rSquared)
        {
            yield break;
        }

        if (fit.Df is not double df)
        {
            yield return Relation.Of(adjusted, fit.Adjusted!.Value, [fit.Figures.RSquared], new Interval(double.NegativeInfinity, rSquared.High), "adjusted R² is at most R²");
            yield break;
        }

        var factor = (fit.Rows!.Value - fit.Intercepts) / df;
        yield return Relation.Of(
            adjusted, fit.Adjusted!.Value, [fit.Figures.RSquared, fit.Figures.Rows], rSquared.Rising(r => 1 - ((1 - r) * factor)), "adjusted R² follows from R², the rows and the number of coefficients");
    }
}
