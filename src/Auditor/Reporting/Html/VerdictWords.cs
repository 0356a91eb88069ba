using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>A verdict in a word and by the id of its shape: never by colour alone.</summary>
internal sealed record VerdictWords(string Word, string Shape)
{
    public static VerdictWords Of(Exclusion exclusion) => RejectedButNegligible(exclusion)
        ? new("Rejected, but negligible", "rejected-negligible")
        : new(WordOf(exclusion.Verdict), exclusion.Verdict.Replace('_', '-'));

    public static string WordOf(string verdict) => verdict switch
    {
        Verdicts.NotSupported => "Not supported",
        Verdicts.Supported => "Supported",
        Verdicts.Inconclusive => "Inconclusive",
        Verdicts.Untestable => "Untestable",
        _ => throw new ArgumentOutOfRangeException(nameof(verdict), verdict, "not a verdict"),
    };

    public static bool RejectedButNegligible(Exclusion exclusion) =>
        exclusion is { Verdict: Verdicts.NotSupported, Materiality: Materialities.ShownNegligible };

    public static bool Contradicted(Exclusion exclusion) =>
        exclusion.Verdict == Verdicts.NotSupported && !RejectedButNegligible(exclusion);

    public static string Materiality(string materiality) => materiality switch
    {
        Materialities.ShownNegligible => "Shown to be negligible",
        Materialities.ShownMaterial => "Shown to be material",
        Materialities.NotShown => "Size not settled",
        _ => throw new ArgumentOutOfRangeException(nameof(materiality), materiality, "not a materiality"),
    };
}
