namespace Auditor.Results;

/// <summary>The results that facts are drawn from.</summary>
internal sealed record AuditResults(
    string ModelId,
    RowAccount Rows,
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
    EliminationResults Elimination);
