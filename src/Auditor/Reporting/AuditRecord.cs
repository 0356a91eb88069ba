using System.Text.Json.Serialization;
using Auditor.Findings;
using Auditor.Results;

namespace Auditor.Reporting;

/// <summary>All that an output needs: ordered, unformatted, the same whatever the output. Written as JSON in snake case it is the record of the audit.</summary>
public sealed record AuditRecord(
    int Record,
    ModelInfo Model,
    string Outcome,
    RowAccount Rows,
    FitSummary FinalFit,
    FitSummary? OtherFit,
    IReadOnlyList<Exclusion> Exclusions,
    Exclusion? AllLeftOut,
    IReadOnlyList<EntangledGroups> Entangled,
    IReadOnlyList<CheckResult> Checks,
    Influence Influence,
    Collinearity Collinearity,
    IReadOnlyList<ClaimResult> Claims,
    IReadOnlyList<StepResult> Elimination,
    IReadOnlyList<Finding> Findings,
    IReadOnlyList<Undecided> Undecided,
    IReadOnlyDictionary<string, object> Policy,
    Provenance Provenance)
{
    /// <summary>Which covariance reproduces the reported standard errors; null when none is reported.</summary>
    public StandardErrorsReproduced? StandardErrorsReproducedBy { get; init; }

    /// <summary>Reported figures that must fit together whatever the data are.</summary>
    public IReadOnlyList<ClaimRelation> ClaimsAgainstEachOther { get; init; } = [];

    /// <summary>What the author's stated rule does by itself; null when no elimination is declared.</summary>
    public EliminationByRule? EliminationByRule { get; init; }

    /// <summary>Policy values that are not the shipped ones, with the shipped value.</summary>
    public IReadOnlyDictionary<string, object> PolicyOverridden { get; init; } = new Dictionary<string, object>();

    /// <summary>Clusters, units and periods that are declared; null in a record that was made without them.</summary>
    [JsonIgnore]
    public StructureCounts? Structure { get; init; }

    /// <summary>Points of the pictures: a way of showing the residuals, not a figure, and so not in the JSON record. Null in a record that was made without them.</summary>
    [JsonIgnore]
    public PlotData? Plots { get; init; }

    /// <summary>Verdicts at other levels and bounds: for readers of the page. Null in a record that was made without them.</summary>
    [JsonIgnore]
    public WhatIf? WhatIf { get; init; }
}

/// <param name="Response">The response's label.</param>
public sealed record ModelInfo(string Id, string? Title, string? Version, string? PreparedBy, string Response, IReadOnlyList<string> Terms, bool Intercept);

/// <param name="Started">UTC, ISO 8601.</param>
public sealed record Provenance(
    string DataSha256,
    string DataSource,
    string DeclarationSha256,
    string Declaration,
    string RulesSha256,
    string ToolVersion,
    long Seed,
    string Started)
{
    /// <summary>Name of the acceptances file; null when none was given.</summary>
    public string? Acceptances { get; init; }

    /// <summary>Of that file.</summary>
    public string? AcceptancesSha256 { get; init; }

    /// <summary>The day on which acceptances must hold, YYYY-MM-DD; null when none were given and no day was asked for.</summary>
    public string? AsOf { get; init; }
}

/// <summary>The audit's overall outcome, as the record writes it.</summary>
public static class Outcomes
{
    public const string ExclusionsNotSupported = "exclusions_not_supported";
    public const string Findings = "findings";
    public const string NothingFound = "nothing_found";
}
