using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Largest residual. Null: no row is out of line (errors normal, of equal variance). The largest absolute externally studentised residual; p two-sided from t on
/// n - r - 1, times the number of observations that have one (Bonferroni), at most 1.
/// </summary>
/// <remarks>Cook and Weisberg 1982, Residuals and Influence in Regression, 2.2 (from memory). Verified against R (tests/reference).</remarks>
public static class LargestResidual
{
    public static CheckOutcome Of(CheckedFit fit, InfluenceSummary influence)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var df = fit.Fit.ResidualDf - 1;
        return influence.Outermost switch
        {
            { AloneSpoilsTheFit: true } row => new UnboundedCheck(df, null, row.Position),
            { StudentisedResidual: double t } row => new CheckStatistic(t, df, null, Math.Min(1, influence.Observations * StudentT.TwoSided(t, df)))
            {
                Position = row.Position,
                LogP = Math.Min(0, Math.Log(influence.Observations) + StudentT.LogTwoSided(t, df)),
                Sizes = [new(SizeMeasure.PartialRSquared, t * t / ((t * t) + df))],
            },
            _ => CheckOutcome.None(CheckImpediment.TooFew),
        };
    }
}
