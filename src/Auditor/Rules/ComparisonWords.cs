using Auditor.Findings;

namespace Auditor.Rules;

/// <summary>The words of rule files.</summary>
internal static class ComparisonWords
{
    public const string PolicyPrefix = "policy.";

    public static readonly OrderedDictionary<string, Comparison> Comparisons = new(StringComparer.Ordinal)
    {
        ["equals"] = Comparison.EqualTo,
        ["not"] = Comparison.Not,
        ["one_of"] = Comparison.OneOf,
        ["below"] = Comparison.Below,
        ["at_most"] = Comparison.AtMost,
        ["above"] = Comparison.Above,
        ["at_least"] = Comparison.AtLeast,
        ["present"] = Comparison.Present,
    };

    public static readonly OrderedDictionary<string, Severity> Severities = new(StringComparer.Ordinal)
    {
        ["high"] = Severity.High,
        ["medium"] = Severity.Medium,
        ["low"] = Severity.Low,
        ["note"] = Severity.Note,
    };

    public static string Word(this Comparison comparison) => Comparisons.First(pair => pair.Value == comparison).Key;

    public static string Word(this Severity severity) => Severities.First(pair => pair.Value == severity).Key;

    public static bool BySize(this Comparison comparison) =>
        comparison is Comparison.Below or Comparison.AtMost or Comparison.Above or Comparison.AtLeast;
}
