using System.Globalization;
using Auditor.Findings;

namespace Auditor.Reporting.Html;

/// <summary>A finding as the page shows it.</summary>
/// <param name="Accepted">Who accepted it, when and until when; null when nobody did.</param>
/// <param name="Because">The approver's reason.</param>
internal sealed record FindingPage(Finding Finding, string Severity, string Subject, string? Accepted, string? Because)
{
    /// <summary>The gravest first, otherwise in the record's order.</summary>
    public static IReadOnlyList<FindingPage> Of(AuditRecord record) =>
        [.. record.Findings.OrderByDescending(finding => finding.Severity).Select(finding => Of(finding, record))];

    private static FindingPage Of(Finding finding, AuditRecord record) => new(
        finding,
        OutcomeSentence.Word(finding.Severity),
        record.Checks.Any(check => check.Check == finding.Subject) ? CheckWords.Title(finding.Subject) : finding.Subject,
        finding.Accepted is { } acceptance ? Words(acceptance) : null,
        finding.Accepted?.Because);

    private static string Words(Acceptance acceptance) => string.Create(
        CultureInfo.InvariantCulture,
        $"Accepted by {acceptance.ApprovedBy} on {acceptance.ApprovedOn:yyyy-MM-dd}, until {acceptance.Expires:yyyy-MM-dd}");
}
