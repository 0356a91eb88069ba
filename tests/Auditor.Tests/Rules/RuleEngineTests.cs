using System.Globalization;
using Auditor.Facts;
using Auditor.Findings;
using Auditor.Rules;
using Auditor.Tests.Facts;

namespace Auditor.Tests.Rules;

public sealed class RuleEngineTests
{
    private static readonly FactValue Missing = new FactValue.NotComputable("no rank");

    [Theory]
    [InlineData("at_most: 0.05", 0.05, true)]
    [InlineData("at_most: 0.05", 0.050000000001, false)]
    [InlineData("below: 0.05", 0.05, false)]
    [InlineData("below: 0.05", 0.049999999999, true)]
    [InlineData("at_least: 0.05", 0.05, true)]
    [InlineData("at_least: 0.05", 0.049999999999, false)]
    [InlineData("above: 0.05", 0.05, false)]
    [InlineData("above: 0.05", 0.050000000001, true)]
    [InlineData("equals: 0.05", 0.05, true)]
    [InlineData("not: 0.05", 0.05, false)]
    [InlineData("one_of: [0.01, 0.05]", 0.05, true)]
    [InlineData("one_of: [0.01, policy.significance]", 0.02, false)]
    [InlineData("at_most: policy.significance", 0.05, true)]
    [InlineData("at_most: policy.significance", 0.06, false)]
    [InlineData("present: true", 0.06, true)]
    [InlineData("present: false", 0.06, false)]
    public void Numbers_are_compared(string test, double p, bool holds) =>
        Assert.Equal(holds, Ask($"{{fact: p, {test}}}", ("p", new FactValue.Number(p))).Holds);

    [Theory]
    [InlineData("{fact: df1, equals: 3}", true)]
    [InlineData("{fact: df1, at_least: 2.5}", true)]
    [InlineData("{fact: df1, one_of: [1, 2]}", false)]
    [InlineData("{fact: verdict, equals: supported}", true)]
    [InlineData("{fact: verdict, not: supported}", false)]
    [InlineData("{fact: verdict, one_of: [untestable, supported]}", true)]
    [InlineData("{fact: group, equals: \"policy.power\"}", false)]
    [InlineData("{fact: rejects, equals: true}", false)]
    [InlineData("{fact: rejects, not: true}", true)]
    public void Counts_words_and_flags_are_compared(string condition, bool holds) => Assert.Equal(holds, Ask(
        condition, ("df1", new FactValue.Count(3)), ("verdict", new FactValue.Text("supported")), ("group", new FactValue.Text("x")), ("rejects", new FactValue.Flag(false))).Holds);

    [Fact]
    public void A_fact_that_could_not_be_computed_leaves_the_rule_undecided_with_the_reason()
    {
        var answer = Ask("{fact: p, at_most: 0.05}", ("p", Missing));

        Assert.Equal(new Answer(null, "p could not be computed: no rank"), answer);
    }

    [Theory]
    [InlineData("present: true", false)]
    [InlineData("present: false", true)]
    public void Presence_is_always_decided(string test, bool holds) => Assert.Equal(holds, Ask($"{{fact: p, {test}}}", ("p", Missing)).Holds);

    [Theory]
    [InlineData(false, false)]
    [InlineData(true, null)]
    public void A_rule_whose_other_condition_fails_does_not_hold_and_is_not_undecided(bool other, bool? expected)
    {
        (string, FactValue)[] facts = [("p", Missing), ("rejects", new FactValue.Flag(other))];

        Assert.Equal(expected, Ask("{fact: p, at_most: 0.05}\n    - {fact: rejects, equals: true}", facts).Holds);
        Assert.Equal(expected, Ask("{fact: rejects, equals: true}\n    - {fact: p, at_most: 0.05}", facts).Holds);
    }

    [Theory]
    [InlineData(true, true)]
    [InlineData(false, null)]
    public void An_alternative_that_holds_decides_whatever_the_others_lack(bool rejects, bool? expected) => Assert.Equal(
        expected, Ask("any: [{fact: p, at_most: 0.05}, {fact: rejects, equals: true}]", ("p", Missing), ("rejects", new FactValue.Flag(rejects))).Holds);

    [Fact]
    public void All_missing_facts_are_named_once_each()
    {
        var answer = Ask(
            "{fact: p, at_most: 0.05}\n    - {fact: p, above: 0.01}\n    - {fact: df2, above: 1}", ("p", Missing), ("df2", new FactValue.NotComputable("no fit")));

        Assert.Equal("p could not be computed: no rank; df2 could not be computed: no fit", answer.Why);
    }

    [Fact]
    public void Findings_come_by_severity_then_rule_then_subject_and_once_for_each_subject()
    {
        var rules = Rules(Row("b-low", "low") + Row("c-high", "high") + Row("a-low", "low"));
        var outcome = RuleEngine.Evaluate(rules, Samples.Policy(), [Set("second", 0.01), Set("first", 0.02), Set("kept", 0.9)]);

        Assert.Equal(
            ["c-high/second", "c-high/first", "b-low/second", "b-low/first", "a-low/second", "a-low/first"],
            outcome.Findings.Select(finding => $"{finding.Rule}/{finding.Subject}"));
        Assert.Empty(outcome.Undecided);
    }

    [Fact]
    public void A_finding_carries_words_source_and_line()
    {
        var outcome = RuleEngine.Evaluate(Rules(Row("rejected", "medium")), Samples.Policy(), [Set("engine", 0.01) with { Line = 7 }]);

        var finding = Assert.Single(outcome.Findings);
        Assert.Equal(
            new Finding("rejected", Severity.Medium, "engine", "p 0.0100 is at most 0.05.", "Test {engine} again.", null, 7) { Source = "from memory" }, finding);
    }

    [Fact]
    public void Undecided_rules_name_rule_and_subject()
    {
        var set = Set("engine", 0.01) with { Values = new Dictionary<string, FactValue> { ["p"] = Missing } };
        var outcome = RuleEngine.Evaluate(Rules(Row("rejected", "medium")), Samples.Policy(), [set]);

        Assert.Empty(outcome.Findings);
        Assert.Equal([new Undecided("rejected", "engine", "p could not be computed: no rank")], outcome.Undecided);
    }

    [Fact]
    public void A_rule_asks_only_subjects_of_its_kind()
    {
        var outcome = RuleEngine.Evaluate(Rules(Row("rejected", "medium")), Samples.Policy(), [Set("reset", 0.01) with { About = About.Check }]);

        Assert.Empty(outcome.Findings);
    }

    [Fact]
    public void The_firms_policy_decides()
    {
        var sets = new[] { Set("engine", 0.03) };

        Assert.Single(RuleEngine.Evaluate(Rules(Row("rejected", "high")), Samples.Policy(), sets).Findings);
        Assert.Empty(RuleEngine.Evaluate(Rules(Row("rejected", "high")), Samples.Policy("significance: 0.01"), sets).Findings);
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fa-IR")]
    public void The_culture_changes_no_word(string culture)
    {
        var before = Thread.CurrentThread.CurrentCulture;
        try
        {
            Thread.CurrentThread.CurrentCulture = new CultureInfo(culture);
            var finding = RuleEngine.Evaluate(Rules(Row("rejected", "high")), Samples.Policy(), [Set("engine", 0.0314159)]).Findings[0];
            Assert.Equal("p 0.0314 is at most 0.05.", finding.Message);
        }
        finally
        {
            Thread.CurrentThread.CurrentCulture = before;
        }
    }

    private static string Row(string id, string severity) => """
        - id: ID
          about: exclusion
          when: [{fact: p, at_most: policy.significance}]
          severity: SEVERITY
          message: "p {p} is at most {policy.significance}."
          advice: "Test {{{group}}} again."
          source: from memory

        """.Replace("ID", id, StringComparison.Ordinal).Replace("SEVERITY", severity, StringComparison.Ordinal);

    private static IReadOnlyList<Rule> Rules(string yaml)
    {
        var reading = RuleReader.Read([("r.yaml", yaml)], Samples.Policy());
        Assert.Empty(reading.Problems);
        return reading.Value!;
    }

    private static FactSet Set(string group, double p) =>
        new(About.Exclusion, group, null, new Dictionary<string, FactValue> { ["p"] = new FactValue.Number(p), ["group"] = new FactValue.Text(group) });

    private static Answer Ask(string conditions, params (string Name, FactValue Value)[] facts)
    {
        var rule = Rules("- id: x\n  about: exclusion\n  when:\n    - " + conditions + "\n  severity: low\n  message: m\n  advice: a\n  source: s\n")[0];
        return rule.Ask(new FactSet(About.Exclusion, "g", null, facts.ToDictionary(fact => fact.Name, fact => fact.Value)), Samples.Policy());
    }
}
