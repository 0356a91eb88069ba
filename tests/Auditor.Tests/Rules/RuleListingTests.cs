using Auditor.Facts;
using Auditor.Rules;
using Auditor.Tests.Facts;

namespace Auditor.Tests.Rules;

public sealed class RuleListingTests
{
    private const string Yaml = """
        - id: rejected
          about: exclusion
          when:
            - {fact: p_adjusted, at_most: policy.significance}
            - any: [{fact: verdict, equals: not_supported}, {fact: rows, above: 1000}]
          severity: high
          message: "Adjusted p {p_adjusted}."
          advice: Put {group} back.
          source: common practice, no source
        - id: lost
          about: rows
          when: [{fact: nothing_lost, equals: false}]
          severity: note
          message: Some rows are lost.
          advice: Look.
          source: common practice, no source
        """;

    private static readonly IReadOnlyList<Rule> Rules = RuleReader.Read([("r.yaml", Yaml)], Samples.Policy()).Value!;

    [Fact]
    public void One_rule_is_explained_in_full()
    {
        var lines = RuleListing.Explain("rejected", Rules, Samples.Policy("significance: 0.01")).Value!;

        Assert.Equal(
            """
            rejected (high), about exclusion

            Holds when
              p_adjusted at_most policy.significance
              any of: verdict equals not_supported; rows above 1,000

            With the policy's
              significance: 0.01

            Facts it rests on
              p_adjusted (number, p): p of the basis test, adjusted for the number of groups.
              verdict (text): What the test says of leaving the group out. One of: not_supported, supported, inconclusive, untestable.
              rows (count, rows): Rows of the group's own test.

            Message: Adjusted p {p_adjusted}.
            Advice: Put {group} back.
            Source: common practice, no source
            Written at: r.yaml, line 1
            """.ReplaceLineEndings("\n"),
            string.Join('\n', lines));
    }

    [Fact]
    public void A_rule_without_policy_values_says_nothing_of_them() =>
        Assert.DoesNotContain("With the policy's", RuleListing.Explain("lost", Rules, Samples.Policy()).Value!);

    [Fact]
    public void An_unknown_id_is_a_problem_with_the_nearest() => Assert.Equal(
        "rules: no rule has the id 'rejectd', and no fact the name; did you mean 'rejected'?",
        Assert.Single(RuleListing.Explain("rejectd", Rules, Samples.Policy()).Problems).ToString());

    [Fact]
    public void A_fact_is_explained_for_all_that_it_is_about()
    {
        var lines = RuleListing.Explain("days_as_periods", Rules, Samples.Policy()).Value!;

        Assert.Equal(
            ["Facts of this name", "  about rows", "    days_as_periods (true or false): Time holds dates and no period is declared: each distinct day is a period of its own."],
            lines);
        Assert.True(RuleListing.Explain("p_adjusted", Rules, Samples.Policy()).Value!.Count(line => line.StartsWith("  about ", StringComparison.Ordinal)) > 1);
    }

    [Fact]
    public void All_rules_and_all_facts_are_listed()
    {
        var lines = RuleListing.All(Rules);

        Assert.Equal(["Rules", "  about exclusion", "    rejected (high)", "  about rows", "    lost (note)", "", "Facts that rules may name"], lines.Take(7));
        Assert.All(FactCatalogue.All, fact => Assert.Contains(lines, line => line.StartsWith($"    {fact.Name} (", StringComparison.Ordinal)));
        Assert.Contains("    incomplete_share (number, share): incomplete as a share of the kept rows.", lines);
    }
}
