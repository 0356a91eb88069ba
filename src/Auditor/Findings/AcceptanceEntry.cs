namespace Auditor.Findings;

/// <summary>One finding that a named approver has accepted, as the acceptances file says it: for one model, one version and a limited time.</summary>
/// <param name="Rule">Id of the rule whose finding is accepted.</param>
/// <param name="Subject">The finding's subject.</param>
/// <param name="Model">Id of the model.</param>
/// <param name="Severity">The finding's severity when it was accepted.</param>
/// <param name="Worst">Beyond it the acceptance does not hold; null: no such limit.</param>
/// <param name="Expires">The last day on which it holds.</param>
/// <param name="Line">Line of the acceptances file.</param>
public sealed record AcceptanceEntry(
    string Rule,
    string Subject,
    string Model,
    string Version,
    Severity Severity,
    WorstAccepted? Worst,
    string ApprovedBy,
    DateOnly ApprovedOn,
    DateOnly Expires,
    string Because,
    int Line);

/// <summary>The worst evidence that the approver accepted. At least one is set.</summary>
/// <param name="P">Smallest p, adjusted where the finding's subject has an adjusted one.</param>
/// <param name="PartialRSquared">Largest estimated partial R².</param>
public sealed record WorstAccepted(double? P, double? PartialRSquared);
