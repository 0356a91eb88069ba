using Auditor.Facts;
using Auditor.Findings;
using Auditor.Rules;

namespace Auditor.Tests.Rules;

public sealed class RuleReaderTests
{
    private const string Whole = """
        - id: rejected
          about: exclusion
          when:
            - {fact: p_adjusted, at_most: policy.significance}
            - {fact: materiality, not: shown_negligible}
          severity: high
          message: "Adjusted p {p_adjusted}, level {policy.significance}, {{group}}."
          advice: Put {group} back.
          source: common practice, no source
        """;

    public static readonly TheoryData<string, string, string> Refused = new()
    {
        { "fact: p_adjusted", "fact: p_adjust", "r.yaml:4: unknown fact 'p_adjust' about 'exclusion'; did you mean 'p_adjusted'?" },
        { "at_most: policy.significance", "at_most: policy.signifcance", "r.yaml:4: unknown policy name 'signifcance'; did you mean 'significance'?" },
        { "at_most: policy.significance", "at_most: policy.row_set", "r.yaml:4: policy.row_set does not fit p_adjusted, which is a number" },
        { "at_most: policy", "at_mots: policy", "r.yaml:4: unknown key 'at_mots' of a condition; did you mean 'at_most'?|r.yaml:4: a condition has exactly one of equals, not, one_of, below, at_most, above, at_least, present" },
        { "at_most: policy.significance", "at_most: '0.05'", "r.yaml:4: 'at_most' for p_adjusted needs a number, found '0.05'" },
        { "at_most: policy.significance", "at_most: [1]", "r.yaml:4: 'at_most' for p_adjusted needs one value" },
        { "at_most: policy.significance", "one_of: 1", "r.yaml:4: 'one_of' for p_adjusted needs a list" },
        { "at_most: policy.significance", "present: maybe", "r.yaml:4: 'present' for p_adjusted needs true or false, found 'maybe'" },
        { "at_most: policy.significance", "at_most: 1, below: 2", "r.yaml:4: a condition has exactly one of equals, not, one_of, below, at_most, above, at_least, present" },
        { "not: shown_negligible", "below: 3", "r.yaml:5: 'below' compares numbers, and materiality is a text" },
        { "not: shown_negligible", "not: shown_neglible", "r.yaml:5: materiality is never 'shown_neglible'; did you mean 'shown_negligible'?" },
        { "{fact: materiality, not: shown_negligible}", "{fact: rests_on_one_row, above: 0}", "r.yaml:5: 'above' compares numbers, and rests_on_one_row is a flag (true or false)" },
        { "{fact: materiality, not: shown_negligible}", "{fact: rests_on_one_row, equals: yes}", "r.yaml:5: 'equals' for rests_on_one_row needs true or false, found 'yes'" },
        { "{fact: materiality, not: shown_negligible}", "{any: []}", "r.yaml:5: 'any' stands alone and holds a list of conditions" },
        { "{fact: materiality, not: shown_negligible}", "{any: [{any: []}]}", "r.yaml:5: unknown key 'any' of a condition; known: fact, equals, not, one_of, below, at_most, above, at_least, present|r.yaml:5: a condition lacks 'fact'|r.yaml:5: a condition has exactly one of equals, not, one_of, below, at_most, above, at_least, present" },
        { "{fact: materiality, not: shown_negligible}", "materiality", "r.yaml:5: a condition must be 'key: value' pairs" },
        { "about: exclusion", "about: exclusions", "r.yaml:2: 'about' of rule 'rejected' cannot be 'exclusions'; did you mean 'exclusion'?" },
        { "severity: high", "severity: grave", "r.yaml:6: 'severity' of rule 'rejected' cannot be 'grave'; known: high, medium, low, note" },
        { "severity: high", "severtiy: high", "r.yaml:1: rule 'rejected' lacks 'severity'|r.yaml:6: unknown key 'severtiy' of a rule; did you mean 'severity'?" },
        { "  source: common practice, no source", "", "r.yaml:1: rule 'rejected' lacks 'source'" },
        { "source: common practice, no source", "source:", "r.yaml:9: 'source' of rule 'rejected' must be a text" },
        { "{p_adjusted}", "{p_adjust}", "r.yaml:7: 'message' of rule 'rejected': unknown fact 'p_adjust' about 'exclusion'; did you mean 'p_adjusted'?" },
        { "{policy.significance},", "{policy.level},", "r.yaml:7: 'message' of rule 'rejected': unknown policy name 'level'; known: significance, adjustment, negligible_partial_r_squared, power, basis_without_structure, row_set, negligible_df, most_parts, part_rows" },
        { "back.", "back {now.", "r.yaml:8: 'advice' of rule 'rejected' has a brace without its partner; write {{ or }} for the sign itself" },
        { "id: rejected", "id: Rejected_1", "r.yaml:1: rule id 'Rejected_1' may hold small letters, digits and hyphens only" },
        { "- id: rejected\n ", "-", "r.yaml:1: a rule lacks 'id'" },
    };

    [Fact]
    public void A_whole_rule_is_read()
    {
        var rule = Assert.Single(Read(Whole).Value!);

        Assert.Equal(("rejected", About.Exclusion, Severity.High, "common practice, no source", "r.yaml", 1), (rule.Id, rule.About, rule.Severity, rule.Source, rule.File, rule.Line));
        Assert.Equal(["p_adjusted at_most policy.significance", "materiality not shown_negligible"], rule.When.Select(condition => condition.Wording));
    }

    [Theory]
    [MemberData(nameof(Refused))]
    public void A_rule_that_cannot_be_used_is_refused_in_exact_words(string right, string wrong, string messages)
    {
        Assert.Contains(right, Whole, StringComparison.Ordinal);
        var reading = Read(Whole.Replace(right, wrong, StringComparison.Ordinal));

        Assert.Null(reading.Value);
        Assert.Equal(messages.Split('|'), reading.Problems.Select(problem => problem.ToString()));
    }

    [Fact]
    public void A_subject_without_facts_says_so()
    {
        var reading = Read(Whole.Replace("about: exclusion", "about: entangled", StringComparison.Ordinal));

        Assert.Equal("r.yaml:4: unknown fact 'p_adjusted': there are no facts about 'entangled' yet", reading.Problems[0].ToString());
    }

    [Fact]
    public void An_id_is_used_once_over_all_files()
    {
        var reading = RuleReader.Read([("a.yaml", Whole), ("b.yaml", "# second\n" + Whole)], ShippedFiles.Policy());

        Assert.Equal(["b.yaml:2: rule id 'rejected' is already used at a.yaml:1"], reading.Problems.Select(problem => problem.ToString()));
    }

    [Theory]
    [InlineData("", "r.yaml:1: the file is empty")]
    [InlineData("id: rejected", "r.yaml:1: a rule file is a list of rules, each starting with '- id:'")]
    [InlineData("- rejected", "r.yaml:1: a rule must be 'key: value' pairs")]
    public void A_file_that_is_no_list_of_rules_is_refused(string yaml, string message) =>
        Assert.Equal([message], Read(yaml).Problems.Select(problem => problem.ToString()));

    [Fact]
    public void Problems_of_all_rules_and_files_are_listed()
    {
        var wrong = Whole.Replace("p_adjusted", "p_ajusted", StringComparison.Ordinal);
        var reading = RuleReader.Read([("a.yaml", wrong), ("b.yaml", wrong + "\n" + Whole)], ShippedFiles.Policy());

        Assert.Equal(["a.yaml:4", "a.yaml:7", "b.yaml:4", "b.yaml:7"], reading.Problems.Select(problem => $"{problem.File}:{problem.Line}"));
    }

    private static Reading<IReadOnlyList<Rule>> Read(string yaml) => RuleReader.Read([("r.yaml", yaml)], Facts.Samples.Policy());
}
