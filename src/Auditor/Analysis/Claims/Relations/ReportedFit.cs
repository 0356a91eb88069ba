using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>What relations between figures of the fit start from: the figures, and the counts that the declared model itself fixes.</summary>
/// <param name="Rank">Coefficients that the declared model has.</param>
/// <param name="Intercepts">1 with an intercept, else 0.</param>
/// <param name="RefitDf">Residual degrees of freedom of the refit, for reports that print no number of rows.</param>
/// <param name="OneScale">Whether all standard errors go with the residual degrees of freedom: not where rows come in clusters.</param>
internal sealed record ReportedFit(ClaimedFit Figures, int Rank, int Intercepts, double RefitDf, bool OneScale, IReadOnlyList<ClaimResult> Results)
{
    /// <summary>Reported rows, null when none are.</summary>
    public double? Rows => Figures.Rows?.Printed.Value;

    /// <summary>n - r from the reported rows; null when none are reported or none would be left.</summary>
    public double? Df => Rows - Rank is > 0 and var df ? df : null;

    public double Terms => Rank - Intercepts;

    public Interval? RSquared => Figures.RSquared is { } figure ? Interval.Of(figure.Printed, 0, 1) : null;

    public Interval? Adjusted => Figures.AdjustedRSquared is { } figure ? Interval.Of(figure.Printed, double.NegativeInfinity, 1) : null;

    /// <summary>The figure was reproduced by a form to which classical identities do not apply.</summary>
    public bool OtherForm(ClaimedFigure claim) => Results.Any(result => result.Claim == claim.Path && result.ReproducedBy is not null);
}
