using Auditor.Facts;
using Auditor.Findings;
using Auditor.Rules;
using Auditor.Yaml;

namespace Auditor.Acceptances;

/// <summary>The findings after acceptance, and what became of each acceptance of this model.</summary>
/// <param name="Findings">As they were given, in the same order; an accepted one says by whom.</param>
public sealed record MatchedAcceptances(IReadOnlyList<Finding> Findings, IReadOnlyList<AcceptanceStanding> Standings);

/// <summary>
/// Holds acceptances against what the rules have found. It comes after every rule about the model has spoken and before the rules about
/// acceptances speak, so that no acceptance can touch a finding about acceptances.
/// </summary>
public static class AcceptanceMatching
{
    /// <param name="findings">What the rules found of the model.</param>
    /// <param name="facts">The facts they found it in.</param>
    public static MatchedAcceptances Of(
        AcceptancesOfRun acceptances, string model, string? version, IReadOnlyList<Finding> findings, IReadOnlyList<FactSet> facts, IReadOnlyList<Rule> rules)
    {
        var standings = acceptances.Entries
            .Where(entry => entry.Model == model)
            .Select(entry => Standing(entry, version, acceptances.AsOf, findings, facts, rules))
            .ToList();
        var holding = standings.Where(standing => standing.Holds).Select(standing => standing.Entry)
            .ToDictionary(entry => (entry.Rule, entry.Subject));
        if (standings.Count == 0)
        {
            standings.AddRange(OfNearModels(acceptances, model, version));
        }

        return new MatchedAcceptances([.. findings.Select(finding => Accepted(finding, holding.GetValueOrDefault((finding.Rule, finding.Subject))))], standings);
    }

    /// <summary>A file may serve many models, so entries of others are nothing to speak of; but where none is for this one, a name that is nearly this one's may be a slip.</summary>
    private static IEnumerable<AcceptanceStanding> OfNearModels(AcceptancesOfRun acceptances, string model, string? version) => acceptances.Entries
        .Where(entry => NearestName.Of(entry.Model, [model]) is not null)
        .Select(entry => new AcceptanceStanding(entry, version, acceptances.AsOf, null, null, null, [], "") { NearModel = entry.Model });

    private static AcceptanceStanding Standing(
        AcceptanceEntry entry, string? version, DateOnly asOf, IReadOnlyList<Finding> findings, IReadOnlyList<FactSet> facts, IReadOnlyList<Rule> rules)
    {
        var ofRule = findings.Where(finding => finding.Rule == entry.Rule).ToList();
        if (ofRule.FirstOrDefault(finding => finding.Subject == entry.Subject) is not { } match)
        {
            return new AcceptanceStanding(entry, version, asOf, null, null, null, [], NearestName.DidYouMean(entry.Subject, [.. ofRule.Select(finding => finding.Subject)]));
        }

        var evidence = Evidence.Of(match, rules.First(rule => rule.Id == entry.Rule), facts);
        var reasons = Lapse.Reasons(entry, version, asOf, match.Severity, evidence);
        return new AcceptanceStanding(entry, version, asOf, match.Severity, evidence.P, evidence.PartialRSquared, reasons, "");
    }

    private static Finding Accepted(Finding finding, AcceptanceEntry? entry) => entry is null
        ? finding
        : finding with { Accepted = new Acceptance(entry.ApprovedBy, entry.ApprovedOn, entry.Expires, entry.Because) };
}
