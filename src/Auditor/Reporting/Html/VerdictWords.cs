using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>A verdict in a word and by the id of its shape: never by colour alone.</summary>
internal sealed record VerdictWords(string Word, string Shape)
{
    public static VerdictWords Of(Exclusion exclusion) => Of(exclusion.Verdict, exclusion.Materiality);

    public static VerdictWords Of(string verdict, string materiality) => RejectedButNegligible(verdict, materiality)
        ? new("Rejected, but negligible", "rejected-negligible")
        : new(WordOf(verdict), verdict.Replace('_', '-'));

    public static string WordOf(string verdict) => verdict switch
    {
        Verdicts.NotSupported => "Not supported",
        Verdicts.Supported => "Supported",
        Verdicts.Inconclusive => "Inconclusive",
        Verdicts.Untestable => "Untestable",
        _ => throw new ArgumentOutOfRangeException(nameof(verdict), verdict, "not a verdict"),
    };

    public static bool RejectedButNegligible(Exclusion exclusion) => RejectedButNegligible(exclusion.Verdict, exclusion.Materiality);

    public static bool Contradicted(Exclusion exclusion) =>
        exclusion.Verdict == Verdicts.NotSupported && !RejectedButNegligible(exclusion);

    public static string Materiality(string materiality) => materiality switch
    {
        Materialities.ShownNegligible => "Shown to be negligible",
        Materialities.ShownMaterial => "Shown to be material",
        Materialities.NotShown => "Size not settled",
        _ => throw new ArgumentOutOfRangeException(nameof(materiality), materiality, "not a materiality"),
    };

    private static bool RejectedButNegligible(string verdict, string materiality) =>
        verdict == Verdicts.NotSupported && materiality == Materialities.ShownNegligible;
}
