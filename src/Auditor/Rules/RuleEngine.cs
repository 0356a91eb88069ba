using Auditor.Facts;
using Auditor.Findings;
using Auditor.Policies;

namespace Auditor.Rules;

/// <summary>What the rules found, and what they could not decide.</summary>
/// <param name="Findings">By severity, the gravest first; within one severity in the order of the rules, within a rule in the order of the subjects.</param>
/// <param name="Undecided">In the order of the rules, within a rule of the subjects.</param>
public sealed record RuleOutcome(IReadOnlyList<Finding> Findings, IReadOnlyList<Undecided> Undecided)
{
    /// <summary>This and what was found later, which comes last within its severity.</summary>
    public RuleOutcome Then(RuleOutcome later) =>
        new([.. Findings.Concat(later.Findings).OrderByDescending(finding => finding.Severity)], [.. Undecided, .. later.Undecided]);
}

/// <summary>Asks every rule about every subject of its kind. A rule speaks once for each subject it holds for.</summary>
public static class RuleEngine
{
    public static RuleOutcome Evaluate(IReadOnlyList<Rule> rules, Policy policy, IReadOnlyList<FactSet> factSets)
    {
        var findings = new List<Finding>();
        var undecided = new List<Undecided>();
        foreach (var rule in rules)
        {
            foreach (var facts in factSets.Where(facts => facts.About == rule.About))
            {
                var answer = rule.Ask(facts, policy);
                if (answer.Holds is null)
                {
                    undecided.Add(new Undecided(rule.Id, facts.Subject, answer.Why!));
                }
                else if (answer.Holds.Value)
                {
                    findings.Add(Found(rule, facts, policy));
                }
            }
        }

        return new RuleOutcome([.. findings.OrderByDescending(finding => finding.Severity)], undecided);
    }

    private static Finding Found(Rule rule, FactSet facts, Policy policy) =>
        new(rule.Id, rule.Severity, facts.Subject, rule.Message.Fill(facts, policy), rule.Advice.Fill(facts, policy), null, facts.Line)
        {
            Source = rule.Source,
        };
}
