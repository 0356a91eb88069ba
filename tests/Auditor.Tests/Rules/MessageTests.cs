using Auditor.Facts;
using Auditor.Rules;
using Auditor.Tests.Facts;

namespace Auditor.Tests.Rules;

public sealed class MessageTests
{
    [Theory]
    [InlineData("p", 0.0, "< 0.0001")]
    [InlineData("p", 1e-301, "< 0.0001")]
    [InlineData("p", 3.21e-8, "< 0.0001")]
    [InlineData("p", 0.00012345, "0.000123")]
    [InlineData("p", 0.04996, "0.0500")]
    [InlineData("p", 0.05004, "0.05004")]
    [InlineData("p", 0.0496, "0.0496")]
    [InlineData("p", 1.0, "1")]
    [InlineData("partial_r_squared", 0.0, "0")]
    [InlineData("partial_r_squared", 0.0123456, "0.0123")]
    [InlineData("effective_rows", 63.218, "63.2")]
    [InlineData("effective_rows", 123456.7, "123,457")]
    [InlineData("rows_needed", 99.96, "100")]
    [InlineData("df2", 37.25, "37.2")]
    [InlineData("f", 2.5e12, "2.500 × 10¹²")]
    public void Numbers_are_shown_by_what_they_are(string fact, double value, string shown) =>
        Assert.Equal(shown, Fill($"{{{fact}}}", About.Exclusion, (fact, new FactValue.Number(value))));

    [Theory]
    [InlineData(0.05, "5 %")]
    [InlineData(0.123456, "12.3 %")]
    [InlineData(0.0, "0 %")]
    [InlineData(1.0, "100 %")]
    public void Shares_are_percentages(double value, string shown) =>
        Assert.Equal(shown, Fill("{incomplete_share}", About.Rows, ("incomplete_share", new FactValue.Number(value))));

    [Fact]
    public void Counts_flags_texts_and_missing_values_are_words() => Assert.Equal("1,234,567 true x not computed", Fill(
        "{rows} {rejects} {group} {p}",
        About.Exclusion,
        ("rows", new FactValue.Count(1234567)),
        ("rejects", new FactValue.Flag(true)),
        ("group", new FactValue.Text("x")),
        ("p", new FactValue.NotComputable("why"))));

    [Fact]
    public void What_a_value_holds_is_never_read_as_template() => Assert.Equal(
        "{p} <b>{policy.power}</b> {{", Fill("{group}", About.Exclusion, ("group", new FactValue.Text("{p} <b>{policy.power}</b> {{"))));

    [Theory]
    [InlineData("{{p}}", "{p}")]
    [InlineData("a {{{p}}} b", "a {0.500} b")]
    [InlineData("level {policy.significance}, {policy.adjustment}, {policy.row_set}", "level 0.05, Holm, own rows")]
    [InlineData("", "")]
    public void Braces_and_policy_names(string template, string filled) =>
        Assert.Equal(filled, Fill(template, About.Exclusion, ("p", new FactValue.Number(0.5))));

    [Theory]
    [InlineData("{p")]
    [InlineData("p}")]
    [InlineData("a } b {p}")]
    public void A_brace_without_a_partner_is_no_template(string text) => Assert.Null(MessageTemplate.Parse(text));

    private static string Fill(string template, About about, params (string Name, FactValue Value)[] facts) => MessageTemplate.Parse(template)!
        .Fill(new FactSet(about, "g", null, facts.ToDictionary(fact => fact.Name, fact => fact.Value)), Samples.Policy());
}
