using Auditor.Findings;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The answer in one sentence, and what must be said beside it.</summary>
internal static class OutcomeSentence
{
    public static string Of(AuditRecord record)
    {
        int all = record.Exclusions.Count;
        int contradicted = record.Exclusions.Count(VerdictWords.Contradicted);
        return (all, contradicted, record.Outcome) switch
        {
            (0, _, Outcomes.Findings) => "No group is declared as left out; other findings " + (AllAccepted(record) ? "have been accepted." : "need attention."),
            (0, _, _) => "No group is declared as left out, and no rule found anything to raise.",
            (1, 1, _) => "The only exclusion is not supported by the data.",
            (_, > 0, _) => $"{NumberText.Count(contradicted)} of {NumberText.Count(all)} exclusions {(contradicted == 1 ? "is" : "are")} not supported by the data.",
            _ when Unsettled(record) is > 0 and var unsettled => $"No exclusion is contradicted by the data, but they do not support {NumberText.Count(unsettled)} of {NumberText.Count(all)} either.",
            (_, _, Outcomes.Findings) => "No exclusion is contradicted by the data beyond the negligible, but there are findings"
                + (AllAccepted(record) ? ", all of them accepted." : " to look at."),
            (1, _, _) => "The only exclusion is supported by the data, and no rule found anything to raise.",
            _ => $"All {NumberText.Count(all)} exclusions are supported by the data, and no rule found anything to raise.",
        };
    }

    /// <summary>What the first sentence does not count: how many, and the negligible rejections by name.</summary>
    public static IReadOnlyList<string> Beside(AuditRecord record)
    {
        var sentences = new List<string>();
        string[] others =
        [
            .. new[] { (Verdicts.Supported, "supported"), (Verdicts.Inconclusive, "inconclusive"), (Verdicts.Untestable, "untestable") }
                .Select(pair => (Count: record.Exclusions.Count(exclusion => exclusion.Verdict == pair.Item1), Word: pair.Item2))
                .Where(pair => pair.Count > 0)
                .Select(pair => $"{NumberText.Count(pair.Count)} {pair.Word}"),
        ];
        if (others.Length > 0 && (record.Exclusions.Any(VerdictWords.Contradicted) || Unsettled(record) > 0))
        {
            sentences.Add((record.Exclusions.Any(VerdictWords.Contradicted) ? "Of the others: " : "") + string.Join(", ", others) + ".");
        }

        string[] negligible = [.. record.Exclusions.Where(VerdictWords.RejectedButNegligible).Select(exclusion => exclusion.Group)];
        if (negligible.Length > 0)
        {
            sentences.Add($"Rejected, but shown to be negligible and so not counted: {Listed(negligible)}.");
        }

        if (record.Exclusions.Count == 0)
        {
            sentences.Add("The outcome rests on the checks and on the report's own figures alone.");
        }

        if (ClaimWords.Failing(record) is { } figures)
        {
            sentences.Add(figures);
        }

        if (record.PolicyOverridden.Count > 0)
        {
            sentences.Add("Judged by a policy that differs from the shipped one: "
                + string.Join("; ", record.PolicyOverridden.Select(pair => $"{CheckWords.Spaced(pair.Key)} {PolicyValue(record.Policy[pair.Key])} (shipped {PolicyValue(pair.Value)})")) + ".");
        }

        return sentences;
    }

    private static string PolicyValue(object value) => value is double number ? NumberText.Plain(number) : Convert.ToString(value, System.Globalization.CultureInfo.InvariantCulture) ?? "";

    /// <summary>Groups that the data neither contradict nor support.</summary>
    private static int Unsettled(AuditRecord record) =>
        record.Exclusions.Count(exclusion => exclusion.Verdict is Verdicts.Inconclusive or Verdicts.Untestable);

    /// <summary>"1 high, 2 medium" of the findings nobody has accepted.</summary>
    public static string Findings(AuditRecord record)
    {
        string[] counts =
        [
            .. Enum.GetValues<Severity>().OrderDescending()
                .Select(severity => (severity, count: record.Findings.Count(finding => finding.Severity == severity && finding.Accepted is null)))
                .Where(pair => pair.count > 0)
                .Select(pair => $"{NumberText.Count(pair.count)} {Word(pair.severity)}"),
        ];
        return counts.Length == 0 ? "none open" : string.Join(", ", counts);
    }

    public static string Word(Severity severity) => severity switch
    {
        Severity.High => "high",
        Severity.Medium => "medium",
        Severity.Low => "low",
        _ => "note",
    };

    /// <summary>"2 findings accepted"; null when there is none.</summary>
    public static string? Accepted(AuditRecord record) => record.Findings.Count(finding => finding.Accepted is not null) switch
    {
        0 => null,
        1 => "1 finding accepted" + On(record),
        var count => $"{NumberText.Count(count)} findings accepted" + On(record),
    };

    private static string On(AuditRecord record) => record.Provenance.AsOf is { } day ? $" as of {day}" : "";

    /// <summary>Nothing that the outcome counts is open.</summary>
    private static bool AllAccepted(AuditRecord record) =>
        !record.Findings.Any(finding => finding.Accepted is null && finding.Severity >= Severity.Low);

    private static string Listed(string[] names)
    {
        const int most = 5;
        return names.Length <= most
            ? string.Join("; ", names)
            : $"{string.Join("; ", names[..most])}; and {NumberText.Count(names.Length - most)} more";
    }
}
