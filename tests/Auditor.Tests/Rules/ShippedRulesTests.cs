using System.Globalization;
using Auditor.Facts;
using Auditor.Policies;
using Auditor.Rules;

namespace Auditor.Tests.Rules;

/// <summary>The rules as they ship, each against its cases.</summary>
public sealed class ShippedRulesTests(ITestOutputHelper output)
{
    private static readonly Policy Policy = ShippedFiles.Policy();
    private static readonly IReadOnlyList<Rule> Rules = ReadRules();
    private static readonly IReadOnlyList<RuleCase> Cases = RuleCase.ReadAll(Rules);

    [Fact]
    public void Every_case_gives_what_it_must()
    {
        var wrong = Cases.Select(Wrong).OfType<string>().ToList();

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{Rules.Count} rules, {Cases.Count} cases"));
        output.WriteLine(string.Join(Environment.NewLine, wrong));
        Assert.Empty(wrong);
        Assert.True(Rules.Count >= 30 && Cases.Count >= 100, "rules or cases are missing from the output folder");
    }

    [Fact]
    public void Every_rule_has_a_case_that_states_its_whole_message() => Assert.All(
        Rules, rule => Assert.Contains(Cases, one => one.Rule == rule && one.Message is not null && !one.Message.Contains("not computed", StringComparison.Ordinal)));

    [Fact]
    public void For_every_condition_there_is_a_case_in_which_it_alone_fails()
    {
        var pairs = Rules.SelectMany(rule => rule.When.Select(condition => (rule, condition))).ToList();

        Assert.True(pairs.Count >= 40, "too few conditions were looked at");
        Assert.All(pairs, pair => Assert.True(
            Cases.Any(one => one.Rule == pair.rule && pair.rule.When.All(
                condition => (condition.Ask(one.Facts, Policy).Holds == false) == (condition == pair.condition))),
            $"{pair.rule.Id}: no case in which only '{pair.condition.Wording}' fails"));
    }

    [Fact]
    public void Every_threshold_has_a_case_exactly_at_it_and_one_close_by_with_the_other_answer()
    {
        var thresholds = Rules.SelectMany(rule => rule.When.OfType<FactCondition>().Where(BySize).Select(condition => (rule, condition))).ToList();

        Assert.True(thresholds.Count >= 12, "too few thresholds were looked at");
        Assert.All(thresholds, pair => AssertBothSides(pair.rule, pair.condition));
    }

    [Fact]
    public void Thresholds_stand_in_the_policy_only_and_each_of_its_own_is_used()
    {
        var used = Rules.SelectMany(rule => rule.When).OfType<FactCondition>().SelectMany(condition => condition.Right).Select(operand => operand.PolicyName).OfType<string>().ToHashSet();
        string[] statistics = ["adjustment", "negligible_partial_r_squared", "basis_without_structure", "row_set", "negligible_df", "most_parts", "part_rows"];

        Assert.All(Rules.SelectMany(rule => rule.When).OfType<FactCondition>().Where(BySize), condition => Assert.NotNull(condition.Right[0].PolicyName));
        Assert.Equal(Policy.Names.Except(statistics).Order(), used.Order());
    }

    [Fact]
    public void Severities_that_are_fixed_are_as_fixed()
    {
        Assert.Equal("high", Severity("exclusion-not-supported"));
        Assert.Equal("note", Severity("exclusion-rejected-but-negligible"));
        Assert.Equal("medium", Severity("exclusion-inconclusive"));
        Assert.Equal("medium", Severity("exclusion-untestable"));
        Assert.Equal("note", Severity("column-declared-level-absent"));
        Assert.Equal("medium", Severity("structure-days-as-periods"));
    }

    /// <summary>So that --fail-on medium sees a part that contradicts what all rows say, or leave open.</summary>
    [Fact]
    public void A_part_that_speaks_against_leaving_a_group_out_is_medium()
    {
        Assert.Equal("medium", Severity("segment-rejected-although-supported"));
        Assert.Equal("medium", Severity("segment-rejected-where-undecided"));
        Assert.Equal("medium", Severity("segment-effect-differs-although-supported"));
    }

    [Fact]
    public void Every_verdict_but_supported_gives_a_finding_whatever_the_materiality()
    {
        var exclusions = Rules.Where(rule => rule.About == About.Exclusion).ToList();
        foreach (var verdict in FactCatalogue.Find(About.Exclusion, "verdict")!.Words)
        {
            foreach (var materiality in FactCatalogue.Find(About.Exclusion, "materiality")!.Words)
            {
                Assert.Equal(verdict != "supported", RuleEngine.Evaluate(exclusions, Policy, [Group(verdict, materiality)]).Findings.Count > 0);
            }
        }
    }

    private static FactSet Group(string verdict, string materiality)
    {
        var values = FactCatalogue.Of(About.Exclusion).ToDictionary(fact => fact.Name, fact => (FactValue)new FactValue.NotComputable("left open"));
        values["verdict"] = new FactValue.Text(verdict);
        values["materiality"] = new FactValue.Text(materiality);
        values["p_adjusted"] = new FactValue.Number(verdict == "not_supported" ? 0.01 : 0.5);
        return new FactSet(About.Exclusion, "group", null, values);
    }

    private static string? Wrong(RuleCase one)
    {
        var outcome = RuleEngine.Evaluate([one.Rule], Policy, [one.Facts]);
        var gave = outcome.Findings.Count > 0 ? "finding" : outcome.Undecided.Count > 0 ? "undecided" : "nothing";
        var message = outcome.Findings is [var finding] ? finding.Message : null;
        return gave != one.Gives ? $"{one.Rule.Id}, {one.Case}: gives {gave}, must give {one.Gives}"
            : one.Message is not null && one.Message != message ? $"{one.Rule.Id}, {one.Case}: says '{message}', must say '{one.Message}'"
            : null;
    }

    private static void AssertBothSides(Rule rule, FactCondition condition)
    {
        var threshold = Amount(condition.Right[0].Resolve(Policy));
        var near = AloneWith(rule, condition)
            .Where(one => one.Facts[condition.Fact.Name] is not FactValue.NotComputable)
            .Select(one => (Value: Amount(one.Facts[condition.Fact.Name]), condition.Ask(one.Facts, Policy).Holds))
            .ToList();
        var at = near.Where(one => one.Value.Equals(threshold)).ToList();
        var room = condition.Fact.Type == FactType.Count ? 1 : 0.1 * threshold;

        Assert.True(at.Count > 0, $"{rule.Id}: no case with {condition.Fact.Name} exactly at {threshold}");
        Assert.True(
            near.Any(one => one.Holds != at[0].Holds && Math.Abs(one.Value - threshold) <= room),
            $"{rule.Id}: no case with {condition.Fact.Name} just on the other side of {threshold}");
    }

    /// <summary>The rule's cases in which every other condition holds, so that this one decides.</summary>
    private static IEnumerable<RuleCase> AloneWith(Rule rule, Condition condition) => Cases.Where(one =>
        one.Rule == rule && rule.When.Where(other => other != condition).All(other => other.Ask(one.Facts, Policy).Holds == true));

    private static bool BySize(FactCondition condition) =>
        condition.Comparison is Comparison.Below or Comparison.AtMost or Comparison.Above or Comparison.AtLeast;

    private static double Amount(FactValue value) => value switch
    {
        FactValue.Number number => number.Value,
        FactValue.Count count => count.Value,
        _ => throw new InvalidOperationException("no number"),
    };

    private static string Severity(string id) => Rules.Single(rule => rule.Id == id).Severity.ToString().ToLowerInvariant();

    private static IReadOnlyList<Rule> ReadRules()
    {
        var reading = RuleReader.Read(ShippedFiles.All(), Policy);
        Assert.Empty(reading.Problems);
        return reading.Value!;
    }
}
