using System.Text.Json.Serialization;

namespace Auditor.Results;

/// <summary>The author's figures: each against the data, and all against each other.</summary>
/// <param name="Figures">In the order of the declaration's keys.</param>
/// <param name="StandardErrors">Which covariance reproduces the reported standard errors; null when none is reported.</param>
internal sealed record ClaimsAudit(
    IReadOnlyList<ClaimResult> Figures, StandardErrorsReproduced? StandardErrors, IReadOnlyList<ClaimRelation> AgainstEachOther);

/// <summary>One figure of the author's report against the data, at the digits in which it was written.</summary>
/// <param name="Claim">Path in the declaration.</param>
/// <param name="What">The figure in words.</param>
/// <param name="Reported">As written.</param>
/// <param name="Recomputed">The value it was compared with: the form that reproduces it, else the first that could be meant; null when there is none.</param>
/// <param name="Outcome">One of <see cref="ClaimOutcomes"/>.</param>
public sealed record ClaimResult(string Claim, string What, string Reported, double? Recomputed, string Outcome)
{
    /// <summary><see cref="Recomputed"/> rounded as the report rounds.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? RecomputedAsPrinted { get; init; }

    /// <summary>The form that reproduces the figure, when that is not the classical one.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? ReproducedBy { get; init; }

    /// <summary><see cref="OtherRows"/> when the figure is reproduced on the other row set only.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? Rows { get; init; }

    /// <summary>Why it cannot be recomputed, or what else must be said of the comparison.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? Why { get; init; }

    /// <summary>What kind of figure it is, one of <see cref="ClaimKinds"/>.</summary>
    [JsonIgnore]
    public string Kind { get; init; } = "";

    /// <summary>Line of the declaration.</summary>
    [JsonIgnore]
    public int? Line { get; init; }

    /// <summary>A p that is not reproduced, reported on one side of the policy's significance and recomputed on the other.</summary>
    [JsonIgnore]
    public bool OtherSideOfSignificance { get; init; }

    /// <summary>An estimate that is not reproduced, reported with one sign and recomputed with the other.</summary>
    [JsonIgnore]
    public bool OtherSign { get; init; }

    public const string OtherRows = "other_rows";
}

/// <summary>What can come of comparing a figure, as the record writes it.</summary>
public static class ClaimOutcomes
{
    public const string Agrees = "agrees";
    public const string LastDigit = "differs_in_the_last_digit";
    public const string Differs = "differs";
    public const string CannotBeRecomputed = "cannot_be_recomputed";

    public static IReadOnlyList<string> All { get; } = [Agrees, LastDigit, Differs, CannotBeRecomputed];
}

/// <summary>The kinds of figures a report prints.</summary>
public static class ClaimKinds
{
    public const string Rows = "rows";
    public const string RSquared = "r_squared";
    public const string ResidualSd = "residual_sd";
    public const string Estimate = "estimate";
    public const string StandardError = "standard_error";
    public const string F = "f";
    public const string Df = "df";
    public const string P = "p";

    public static IReadOnlyList<string> All { get; } = [Rows, RSquared, ResidualSd, Estimate, StandardError, F, Df, P];
}

/// <summary>The covariance of the coefficients that reproduces most of the reported standard errors.</summary>
/// <param name="Covariance">Null when none reproduces any; <paramref name="Why"/> then names those tried.</param>
/// <param name="AlsoReproducedBy">Others that reproduce as many: the digits printed do not tell them apart.</param>
/// <param name="Rows">Null for the fit shown.</param>
public sealed record StandardErrorsReproduced(
    string? Covariance,
    int Reproduced,
    int Of,
    IReadOnlyList<string> AlsoReproducedBy,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Rows,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>Reported figures that must fit together whatever the data are.</summary>
/// <param name="Claims">Their paths; the first is the one that follows from the others.</param>
/// <param name="Relation">What must hold, in words.</param>
/// <param name="Consistent">Some numbers that round to the figures meet it.</param>
public sealed record ClaimRelation(
    IReadOnlyList<string> Claims,
    string Relation,
    bool Consistent,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);
