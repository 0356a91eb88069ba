using System.Text.Json.Serialization;

namespace Auditor.Results;

/// <summary>One step of the author's elimination, tested again in that step's model: everything that was still in.</summary>
/// <param name="BreaksRule">The stated rule would not have taken this step; null when that cannot be said.</param>
public sealed record StepResult(
    int Step,
    string Drop,
    double? F,
    double? Df1,
    double? Df2,
    double? P,
    bool? BreaksRule,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why)
{
    [JsonPropertyName("log10_p"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Log10P { get; init; }

    /// <summary>How the step breaks the rule, in words; null when it does not.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? BreaksBecause { get; init; }

    /// <summary>Line of the declaration.</summary>
    [JsonIgnore]
    public int? Line { get; init; }
}

/// <summary>What the stated rule itself does from the largest model on, whatever steps the author lists.</summary>
/// <param name="Rule">drop_above, drop_worse_aic, drop_worse_bic or judgement.</param>
/// <param name="Bound">p above which drop_above drops; null under other rules.</param>
/// <param name="By">group or term: how left-out groups were dropped.</param>
/// <param name="Forced">Final terms that the rule could not drop.</param>
/// <param name="Rows">Rows complete for the final model and every group; all of the path is on them.</param>
/// <param name="Drops">In the rule's order.</param>
/// <param name="Kept">What the rule keeps, forced terms aside.</param>
/// <param name="EndsInReportedModel">Null when the rule cannot be replayed.</param>
/// <param name="KeptThoughLeftOut">What the rule keeps and the report left out.</param>
/// <param name="DroppedThoughKept">What the rule drops and the report kept.</param>
/// <param name="GroupsNotInSteps">Left-out groups that the author's steps do not name; empty when no steps are given.</param>
public sealed record EliminationByRule(
    string Rule,
    double? Bound,
    string By,
    IReadOnlyList<string> Forced,
    int Rows,
    IReadOnlyList<RuleDrop> Drops,
    IReadOnlyList<string> Kept,
    bool? EndsInReportedModel,
    IReadOnlyList<string> KeptThoughLeftOut,
    IReadOnlyList<string> DroppedThoughKept,
    IReadOnlyList<string> GroupsNotInSteps,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>One unit that the rule drops.</summary>
/// <param name="Drop">Name of a left-out group, or label of a term.</param>
/// <param name="LeftOut">The report left it out too.</param>
/// <param name="CriterionChange">Change of AIC or BIC; null under a rule by p.</param>
public sealed record RuleDrop(
    int Step,
    string Drop,
    bool LeftOut,
    double? F,
    double? Df1,
    double? Df2,
    double? P,
    [property: JsonPropertyName("log10_p"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? Log10P,
    double? CriterionChange,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>p of a group given that the stated rule left it out on these rows.</summary>
public sealed record SelectiveFigures(double? P, [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why)
{
    [JsonPropertyName("log10_p"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Log10P { get; init; }

    /// <summary>The common rows, on which the rule is replayed.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public int? Rows { get; init; }

    /// <summary>p of the partial F on the same rows, which takes no account of the rule.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? PlainP { get; init; }

    /// <summary>How often, without any effect of the group, the rule would have left the same groups out.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Selection { get; init; }
}

/// <summary>Everything found of a declared elimination.</summary>
/// <param name="ByRule">Null when no elimination is declared.</param>
/// <param name="Selective">By group, in declared order.</param>
/// <param name="LeftOutByRule">By group: a rule that looks at the data is stated, and replayed it drops the group (or cannot be replayed).</param>
internal sealed record EliminationResults(
    IReadOnlyList<StepResult> Steps, EliminationByRule? ByRule, IReadOnlyList<SelectiveFigures> Selective, IReadOnlyList<bool> LeftOutByRule);

/// <summary>The stated rules, as the record writes them.</summary>
public static class EliminationRules
{
    public const string DropAbove = "drop_above";
    public const string DropWorseAic = "drop_worse_aic";
    public const string DropWorseBic = "drop_worse_bic";
    public const string Judgement = "judgement";
}
