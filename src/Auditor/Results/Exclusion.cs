using System.Text.Json.Serialization;

namespace Auditor.Results;

/// <summary>What the data say of one left-out group (or of all left-out terms jointly). Numbers, names and reasons; no formatting.</summary>
/// <param name="Rows">Rows n of the group's own test.</param>
/// <param name="Df1">Rank q that the group adds.</param>
/// <param name="Basis">Name of the test on which the verdict rests.</param>
/// <param name="P">p of the basis test.</param>
public sealed record Exclusion(
    string Group,
    IReadOnlyList<string> Terms,
    int Rows,
    int? Df1,
    double? Df2,
    double? RssWithout,
    double? RssWith,
    GroupTests Tests,
    IReadOnlyDictionary<string, string> TestsNotComputed,
    string Basis,
    string BasisReason,
    double? P,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? Log10P,
    double? PAdjusted,
    [property: JsonPropertyName("log10_p_adjusted"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? Log10PAdjusted,
    SelectiveFigures Selective,
    EffectFigures PartialRSquared,
    double? EffectiveRows,
    NegligibleFigures Negligible,
    PowerFigures Power,
    OtherRowSetFigures? OtherRowSet,
    string Verdict,
    string Materiality,
    string Reason,
    IReadOnlyList<AliasedColumn> Aliased,
    IReadOnlyList<NearlyAliasedColumn> NearlyAliased)
{
    /// <summary>The verdict's reason for who reads nothing else: a short sentence.</summary>
    public string InShort { get; init; } = "";

    /// <summary>The level on which the group's columns vary: row, period, cluster, unit or several; null when no dependence is declared.</summary>
    public string? Level { get; init; }

    /// <summary>The test of the basis itself, on which p rests; null when it has no value.</summary>
    public TestFigures? BasisTest { get; init; }

    /// <summary>The variable by which the basis sums rows into clusters: the declared cluster, or the unit where the group does not vary within one; null for another basis.</summary>
    public string? BasisClustersOn { get; init; }

    /// <summary>The group in segments and in parts of the time span; empty when neither is declared.</summary>
    public IReadOnlyList<GroupInParts> InParts { get; init; } = [];

    /// <summary>Clusters or periods that the test the verdict rests on sums over; null when it takes row by row.</summary>
    public int? BasisSums { get; init; }

    /// <summary>How many equal clusters those that the basis sums over are worth for this group, or the declared ones where it sums over none; null without clusters.</summary>
    public double? EffectiveClusters { get; init; }

    /// <summary>What the score form the verdict rests on can reach; null when it rests on another kind. The record shows it beside the tests.</summary>
    [JsonIgnore]
    public ScoreCeiling? Ceiling { get; init; }

    /// <summary>The author's reason as declared; null when none was given.</summary>
    public string? Because { get; init; }

    /// <summary>Power of the basis test against the size of the effect; only where the verdict is inconclusive.</summary>
    [JsonIgnore]
    public IReadOnlyList<PowerPoint> PowerCurve { get; init; } = [];

    /// <summary>Line of the declaration where the group stands.</summary>
    [JsonIgnore]
    public int? Line { get; init; }

    /// <summary>For values that are null: record path below the exclusion, and why.</summary>
    [JsonIgnore]
    public IReadOnlyDictionary<string, string> Why { get; init; } = new Dictionary<string, string>();

    /// <summary>Why p and what follows from it is null; absent when it is not.</summary>
    [JsonPropertyName("why"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? WhyNull => P is null ? Why.GetValueOrDefault("p") : null;
}

/// <summary>Partial R² with its classical and basis interval at 1 - 2 significance.</summary>
public sealed record EffectFigures(
    double? Estimate,
    double? Lower,
    double? Upper,
    double? BasisLower,
    double? BasisUpper,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>Test of the null that the partial R² is at least <paramref name="Bound"/>.</summary>
public sealed record NegligibleFigures(
    double Bound,
    double? P,
    double? PAdjusted,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

public sealed record PowerFigures(
    double? AtBound,
    double? SmallestDetectableFSquared,
    double? RowsNeeded,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why)
{
    /// <summary>What <see cref="RowsNeeded"/> counts: rows, clusters or periods.</summary>
    public string CountedIn { get; init; } = "rows";
}

/// <summary>The same test on the other row set.</summary>
public sealed record OtherRowSetFigures(int Rows, double? F, double? Df1, double? Df2, double? P, string Verdict);

/// <param name="P">Where the form's p ends as the effect grows without limit.</param>
/// <param name="CannotReject">It is above the policy's significance.</param>
/// <param name="UnrestrictedP">p of the same kind of test with the group in the model; null when it has none.</param>
public sealed record ScoreCeiling(double P, bool CannotReject, double? UnrestrictedP);

/// <summary>A column that adds nothing, and the combination of earlier columns it equals.</summary>
public sealed record AliasedColumn(string Column, [property: JsonPropertyName("equals")] string Combination);

/// <summary>A column that is nearly a combination of earlier ones, and the decimal digits lost by it.</summary>
public sealed record NearlyAliasedColumn(string Column, double DigitsLost);

/// <summary>The states of a verdict, as the record writes them.</summary>
public static class Verdicts
{
    public const string NotSupported = "not_supported";
    public const string Supported = "supported";
    public const string Inconclusive = "inconclusive";
    public const string Untestable = "untestable";
}

/// <summary>What the interval says of the effect against the policy's bound.</summary>
public static class Materialities
{
    public const string ShownNegligible = "shown_negligible";
    public const string ShownMaterial = "shown_material";
    public const string NotShown = "not_shown";
}
