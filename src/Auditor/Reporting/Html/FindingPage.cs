using System.Globalization;
using Auditor.Findings;

namespace Auditor.Reporting.Html;

/// <summary>A finding as the page shows it.</summary>
/// <param name="Accepted">Who accepted it, when and until when; null when nobody did.</param>
/// <param name="Because">The approver's reason.</param>
internal sealed record FindingPage(Finding Finding, string Severity, string Subject, string? Accepted, string? Because)
{
    /// <summary>Id of the finding on the page.</summary>
    public string Anchor { get; init; } = "";

    /// <summary>The gravest first, otherwise in the record's order.</summary>
    public static IReadOnlyList<FindingPage> Of(AuditRecord record) =>
        [.. record.Findings.OrderByDescending(finding => finding.Severity).Select((finding, index) => Of(finding, record) with { Anchor = string.Create(CultureInfo.InvariantCulture, $"finding-{index + 1}") })];

    private static FindingPage Of(Finding finding, AuditRecord record) => new(
        finding,
        OutcomeSentence.Word(finding.Severity),
        SubjectWords(finding.Subject, record),
        finding.Accepted is { } acceptance ? Words(acceptance) : null,
        finding.Accepted?.Because);

    /// <summary>What a finding is about, for readers: the record's names of checks, figures and of the model itself in words.</summary>
    public static string SubjectWords(string subject, AuditRecord record) =>
        record.Checks.Any(check => check.Check == subject) ? CheckWords.Title(subject)
        : record.Claims.FirstOrDefault(claim => claim.Claim == subject) is { } claimed ? claimed.What
        : subject == record.Model.Id && record.Exclusions.All(exclusion => exclusion.Group != subject) ? "The final model"
        : subject;

    private static string Words(Acceptance acceptance) => string.Create(
        CultureInfo.InvariantCulture,
        $"Accepted by {acceptance.ApprovedBy} on {acceptance.ApprovedOn:yyyy-MM-dd}, until {acceptance.Expires:yyyy-MM-dd}");
}
