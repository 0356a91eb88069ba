namespace Auditor.Findings;

/// <summary>How much a finding matters. The order is the order of concern.</summary>
public enum Severity
{
    Note,
    Low,
    Medium,
    High,
}

/// <summary>What a rule found of one subject.</summary>
/// <param name="Rule">The rule's stable id.</param>
/// <param name="Subject">Whom it is about: a group, check, claim path, label, row number, or the model id.</param>
/// <param name="Accepted">Who accepted it, when someone did.</param>
/// <param name="Line">Line of the declaration, where it has one.</param>
public sealed record Finding(
    string Rule, Severity Severity, string Subject, string Message, string Advice, Acceptance? Accepted, int? Line)
{
    /// <summary>The reference the rule rests on.</summary>
    public string Source { get; init; } = "";
}

public sealed record Acceptance(string ApprovedBy, DateOnly ApprovedOn, DateOnly Expires, string Because);

/// <summary>A rule that could not decide, and why: never taken as "does not hold".</summary>
public sealed record Undecided(string Rule, string Subject, string Why);
