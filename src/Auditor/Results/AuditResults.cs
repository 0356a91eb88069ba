namespace Auditor.Results;

/// <summary>The results that facts are drawn from.</summary>
internal sealed record AuditResults(
    string ModelId,
    RowAccount Rows,
    StructureCounts Structure,
    FitSummary FinalFit,
    FitSummary? OtherFit,
    bool Perfect,
    IReadOnlyList<Exclusion> Exclusions,
    IReadOnlyList<ExclusionInputs> ExclusionInputs,
    Exclusion? AllLeftOut,
    IReadOnlyList<CheckResult> Checks,
    Influence Influence,
    Collinearity Collinearity,
    PlotData Plots,
    EliminationResults Elimination)
{
    /// <summary>Null when it was not asked for.</summary>
    public WhatIf? WhatIf { get; init; }

    /// <summary>The author's reported figures, compared.</summary>
    public required ClaimsAudit Claims { get; init; }
}
