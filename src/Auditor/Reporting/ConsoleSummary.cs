using System.Text;
using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Reporting;

/// <summary>The short verdict a person wants on the screen: one sentence, a line for each exclusion, what else was found.</summary>
public static class ConsoleSummary
{
    private const int WidestName = 32;

    public static string Of(AuditRecord record)
    {
        var text = new StringBuilder();
        text.Append(record.Model.Title ?? record.Model.Id).Append('\n');
        text.Append(OutcomeSentence.Of(record)).Append('\n');
        var name = Math.Min(WidestName, record.Exclusions.Select(exclusion => exclusion.Group.Length).DefaultIfEmpty(0).Max());
        foreach (var exclusion in record.Exclusions)
        {
            text.Append("  ").Append(exclusion.Group.PadRight(name)).Append("  ")
                .Append(VerdictWords.Of(exclusion).Word).Append(". ").Append(exclusion.Reason).Append('\n');
        }

        if (ClaimWords.Failing(record) is { } figures)
        {
            text.Append(figures).Append('\n');
        }

        text.Append("Findings: ").Append(OutcomeSentence.Findings(record)).Append(OutcomeSentence.Accepted(record) is { } accepted ? $"; {accepted}.\n" : ".\n");
        text.Append("Statistical evidence, not approval: the firm's policy, local rules and qualified people decide.\n");
        return text.ToString();
    }

    /// <summary>The outcome of a self-test, and each case that does not agree.</summary>
    public static string Of(SelfTestRecord record)
    {
        var page = new SelfTestPage(record);
        var text = new StringBuilder();
        text.Append(page.Outcome).Append(" (").Append(page.Compared).Append(").\n");
        foreach (var one in record.Cases.Where(one => !one.Passed))
        {
            var below = one.Quantities.Where(quantity => !quantity.Passed).Select(quantity => quantity.Kind).Distinct();
            text.Append("  ").Append(one.Id).Append(": ").Append(one.Fault ?? string.Join(", ", below)).Append('\n');
        }

        return text.Append(record.Meaning).Append('\n').ToString();
    }
}
