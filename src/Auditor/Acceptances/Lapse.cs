using System.Globalization;
using Auditor.Findings;

namespace Auditor.Acceptances;

/// <summary>
/// Why an acceptance does not hold for a finding. It holds for what the approver looked at and no worse: that version, that severity, that
/// strength of evidence, until that day. Evidence that cannot be computed is not shown to be no worse, so the acceptance does not hold.
/// </summary>
internal static class Lapse
{
    public static IReadOnlyList<string> Reasons(AcceptanceEntry entry, string? modelVersion, DateOnly asOf, Severity found, Evidence evidence) =>
        [.. Days(entry, asOf), .. Version(entry, modelVersion), .. Graveness(entry, found), .. Worse(entry.Worst, evidence)];

    private static IEnumerable<string> Days(AcceptanceEntry entry, DateOnly asOf)
    {
        if (entry.Expires < asOf)
        {
            yield return string.Create(CultureInfo.InvariantCulture, $"it expired on {entry.Expires:yyyy-MM-dd}, before {asOf:yyyy-MM-dd}");
        }

        if (entry.ApprovedOn > asOf)
        {
            yield return string.Create(CultureInfo.InvariantCulture, $"it was approved on {entry.ApprovedOn:yyyy-MM-dd} only, after {asOf:yyyy-MM-dd}");
        }
    }

    private static IEnumerable<string> Version(AcceptanceEntry entry, string? modelVersion)
    {
        if (entry.Version != modelVersion)
        {
            yield return modelVersion is null
                ? $"it is for version {entry.Version} of the model, and the declaration states no version"
                : $"it is for version {entry.Version} of the model, not {modelVersion}";
        }
    }

    private static IEnumerable<string> Graveness(AcceptanceEntry entry, Severity found)
    {
        if (entry.Severity != found)
        {
            yield return $"it is for a finding of severity {entry.Severity.InWords()}, and this one is {found.InWords()}";
        }
    }

    private static IEnumerable<string> Worse(WorstAccepted? worst, Evidence evidence)
    {
        if (worst?.P is double leastP && !(evidence.P >= leastP))
        {
            yield return evidence.P is double p
                ? $"p is {PlainNumber.Probability(p, null, leastP)}, below the accepted {PlainNumber.Digits(leastP, 3)}"
                : "there is no p to hold against the accepted one: " + evidence.PWhy;
        }

        if (worst?.PartialRSquared is double most && !(evidence.PartialRSquared <= most))
        {
            yield return evidence.PartialRSquared is double effect
                ? $"partial R² is {PlainNumber.Share(effect)}, above the accepted {PlainNumber.Digits(most, 4)}"
                : "there is no partial R² to hold against the accepted one: " + evidence.EffectWhy;
        }
    }
}
