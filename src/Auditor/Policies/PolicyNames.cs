namespace Auditor.Policies;

/// <summary>The fixed names of a policy, their words and their ranges. Every further name is defined by the shipped file alone.</summary>
internal static class PolicyNames
{
    public const string Significance = "significance";
    public const string Adjustment = "adjustment";
    public const string NegligiblePartialRSquared = "negligible_partial_r_squared";
    public const string Power = "power";
    public const string BasisWithoutStructure = "basis_without_structure";
    public const string RowSet = "row_set";
    public const string NegligibleDf = "negligible_df";
    public const string MostParts = "most_parts";
    public const string PartRows = "part_rows";

    public static readonly OrderedDictionary<string, AdjustmentMethod> Adjustments = new(StringComparer.Ordinal)
    {
        ["holm"] = AdjustmentMethod.Holm,
        ["hochberg"] = AdjustmentMethod.Hochberg,
        ["benjamini_hochberg"] = AdjustmentMethod.BenjaminiHochberg,
        ["benjamini_yekutieli"] = AdjustmentMethod.BenjaminiYekutieli,
        ["max_t"] = AdjustmentMethod.MaxT,
        ["closed"] = AdjustmentMethod.Closed,
        ["none"] = AdjustmentMethod.None,
    };

    public static readonly OrderedDictionary<string, BasisWithoutStructure> Bases = new(StringComparer.Ordinal)
    {
        ["hc3"] = Policies.BasisWithoutStructure.Hc3,
        ["classical"] = Policies.BasisWithoutStructure.Classical,
    };

    public static readonly OrderedDictionary<string, RowSet> RowSets = new(StringComparer.Ordinal)
    {
        ["own"] = Policies.RowSet.Own,
        ["common"] = Policies.RowSet.Common,
    };

    /// <summary>What may stand under each fixed name, and its default.</summary>
    public static readonly OrderedDictionary<string, FixedName> Fixed = new(StringComparer.Ordinal)
    {
        [Significance] = new(PolicyValue.Of(PolicyType.Number, 0.05), new Between(0, 0.5), [], []),
        [Adjustment] = new(PolicyValue.Of("holm"), null, [.. Adjustments.Keys], ["max_t", "closed"]),
        [NegligiblePartialRSquared] = new(PolicyValue.Of(PolicyType.Number, 0.01), new Between(0, 1), [], []),
        [Power] = new(PolicyValue.Of(PolicyType.Number, 0.8), new Between(0, 1), [], []),
        [BasisWithoutStructure] = new(PolicyValue.Of("hc3"), null, [.. Bases.Keys], []),
        [RowSet] = new(PolicyValue.Of("own"), null, [.. RowSets.Keys], []),
        [NegligibleDf] = new(PolicyValue.Of(PolicyType.Count, 5), null, [], []),
        [MostParts] = new(PolicyValue.Of(PolicyType.Count, 12), null, [], []),
        [PartRows] = new(PolicyValue.Of(PolicyType.Count, 20), null, [], []),
    };
}

/// <param name="Default">Holds when the base file does not give the name.</param>
/// <param name="Words">The words it may be, when it is a word.</param>
/// <param name="NotBuilt">Those of them that are known and cannot be used yet.</param>
internal sealed record FixedName(PolicyValue Default, Between? Range, IReadOnlyList<string> Words, IReadOnlyList<string> NotBuilt);

/// <summary>An open interval.</summary>
internal sealed record Between(double Low, double High)
{
    public bool Holds(double value) => value > Low && value < High;
}
