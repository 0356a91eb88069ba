using System.Globalization;
using Auditor.Findings;

namespace Auditor.Facts;

/// <summary>The facts of one acceptance of this model. They are drawn when all other rules have spoken.</summary>
public static class AcceptanceFacts
{
    private static readonly FactFamily<AcceptanceStanding> Family = new FactFamily<AcceptanceStanding>(About.Acceptance)
        .Text("rule", "Rule whose finding is accepted.", standing => standing.Entry.Rule)
        .Text("subject", "Subject of that finding.", standing => standing.Entry.Subject)
        .Text("approved_by", "Who accepted it.", standing => standing.Entry.ApprovedBy)
        .Text("approved_on", "The day on which.", standing => Day(standing.Entry.ApprovedOn))
        .Text("expires", "The last day on which it holds.", standing => Day(standing.Entry.Expires))
        .Text("because", "The approver's reason.", standing => standing.Entry.Because)
        .Count("line", FactUnits.None, "Its line in the acceptances file.", standing => standing.Entry.Line)
        .Text("as_of", "The day that decides.", standing => Day(standing.AsOf))
        .Count("days_left", "days", "Days from as_of to expires; below 0 when it has expired.", standing => standing.DaysLeft)
        .Text("accepted_version", "Version of the model it is for.", standing => standing.Entry.Version)
        .Text("model_version", "Version of the audited model.", standing => standing.ModelVersion, _ => "the declaration states no version")
        .Word("accepted_severity", "Severity of the finding it is for.", SeverityWords.All, standing => standing.Entry.Severity.InWords())
        .Word("severity", "Severity of the finding in this audit.", SeverityWords.All, standing => standing.Found?.InWords(), NoFinding)
        .Number("worst_p", FactUnits.P, "Smallest p that is accepted.", standing => standing.Entry.Worst?.P, _ => "the acceptance sets no such limit")
        .Number("p", FactUnits.P, "p of the finding's subject, adjusted where it has an adjusted one.", standing => standing.P, NoValue)
        .Number("worst_partial_r_squared", FactUnits.PartialRSquared, "Largest partial R² that is accepted.",
            standing => standing.Entry.Worst?.PartialRSquared, _ => "the acceptance sets no such limit")
        .Number("partial_r_squared", FactUnits.PartialRSquared, "Estimated partial R² of the finding's subject.", standing => standing.PartialRSquared, NoValue)
        .Flag("for_near_model", "It is for a model whose name is nearly this one's, and no acceptance is for this one.", standing => standing.NearModel is not null)
        .Text("near_model", "That model.", standing => standing.NearModel, _ => "it is for this model")
        .Flag("matched", "This audit made the finding that it is for.", standing => standing.Matched)
        .Flag("lapsed", "This audit made the finding, and it does not hold for it.", standing => standing.Matched && !standing.Holds)
        .Text("lapsed_because", "Why it does not hold.", standing => standing.Reasons.Count > 0 ? string.Join("; ", standing.Reasons) : null, _ => "nothing speaks against it")
        .Text("hint", "The end of a sentence on an acceptance that is not matched: the subject that was probably meant, or a full stop.",
            standing => standing.Hint.Length > 0 ? standing.Hint : ".");

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(AcceptanceStanding standing) => Family.From(standing, standing.Entry.Rule + ": " + standing.Entry.Subject, null);

    private static string Day(DateOnly day) => day.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);

    private static string NoFinding(AcceptanceStanding standing) => "this audit made no such finding";

    private static string NoValue(AcceptanceStanding standing) => standing.Matched ? "the finding's subject has no such value" : NoFinding(standing);
}
