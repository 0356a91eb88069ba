using Auditor.Facts;
using Auditor.Policies;
using Auditor.Yaml;

namespace Auditor.Rules;

/// <summary>Rules and facts as plain lines, for people who read or write rule files.</summary>
public static class RuleListing
{
    /// <summary>Every rule, then every fact with its type and unit, by what they are about.</summary>
    public static IReadOnlyList<string> All(IReadOnlyList<Rule> rules) =>
    [
        "Rules",
        .. AboutWithLines(about => [.. rules.Where(rule => rule.About == about).Select(Line)]),
        "",
        "Facts that rules may name",
        .. AboutWithLines(about => [.. FactCatalogue.Of(about).Select(Line)]),
    ];

    /// <summary>One rule in full, with the policy's values and the facts it rests on; else the facts of that name; or the nearest name when there is neither.</summary>
    public static Reading<IReadOnlyList<string>> Explain(string id, IReadOnlyList<Rule> rules, Policy policy)
    {
        var facts = AboutWithLines(about => [.. FactCatalogue.Of(about).Where(fact => fact.Name == id).Select(Line)]).ToList();
        return rules.FirstOrDefault(rule => rule.Id == id) is { } rule ? Reading<IReadOnlyList<string>>.Of(Explain(rule, policy))
            : facts.Count > 0 ? Reading<IReadOnlyList<string>>.Of(["Facts of this name", .. facts])
            : Reading<IReadOnlyList<string>>.Failed(new Problem("rules", null, $"no rule has the id '{id}', and no fact the name" + NearestName.DidYouMean(id, Names(rules))));
    }

    private static IReadOnlyCollection<string> Names(IReadOnlyList<Rule> rules) =>
        [.. rules.Select(rule => rule.Id), .. Enum.GetValues<About>().SelectMany(FactCatalogue.Of).Select(fact => fact.Name).Distinct()];

    private static IEnumerable<string> AboutWithLines(Func<About, IReadOnlyList<string>> linesOf) =>
        Enum.GetValues<About>()
            .Select(about => (about, lines: linesOf(about)))
            .Where(group => group.lines.Count > 0)
            .SelectMany(group => group.lines.Select(line => "    " + line).Prepend("  about " + group.about.Word()));

    private static string Line(Rule rule) => $"{rule.Id} ({rule.Severity.Word()})";

    private static string Line(FactDefinition fact)
    {
        var unit = fact.Unit.Length > 0 ? ", " + fact.Unit : "";
        var words = fact.Words.Count > 0 ? " One of: " + string.Join(", ", fact.Words) + "." : "";
        return $"{fact.Name} ({TypeWord(fact.Type)}{unit}): {fact.Meaning}{words}";
    }

    private static IReadOnlyList<string> Explain(Rule rule, Policy policy) =>
    [
        Line(rule) + ", about " + rule.About.Word(),
        "",
        "Holds when",
        .. rule.When.Select(condition => "  " + condition.Wording),
        .. Titled("With the policy's", PolicyNames(rule).Select(name => PolicyLine(name, policy))),
        .. Titled("Facts it rests on", FactsOf(rule).Select(Line)),
        "",
        "Message: " + rule.Message.Text,
        "Advice: " + rule.Advice.Text,
        "Source: " + rule.Source,
        $"Written at: {rule.File}, line {rule.Line.ToString(System.Globalization.CultureInfo.InvariantCulture)}",
    ];

    private static IEnumerable<string> Titled(string title, IEnumerable<string> lines)
    {
        var all = lines.Select(line => "  " + line).ToList();
        return all.Count == 0 ? [] : ["", title, .. all];
    }

    private static IEnumerable<FactCondition> Tests(Rule rule) => rule.When.SelectMany(
        condition => condition is AnyCondition any ? any.Alternatives : [(FactCondition)condition]);

    private static IEnumerable<FactDefinition> FactsOf(Rule rule) => Tests(rule).Select(test => test.Fact).Distinct();

    private static IEnumerable<string> PolicyNames(Rule rule) =>
        Tests(rule).SelectMany(test => test.Right).Select(operand => operand.PolicyName).OfType<string>().Distinct();

    private static string PolicyLine(string name, Policy policy) =>
        policy.TryGet(name, out var value) ? $"{name}: {Figures.Setting(value.AsFact())}" : name;

    private static string TypeWord(FactType type) => type switch
    {
        FactType.Count => "count",
        FactType.Text => "text",
        FactType.Flag => "true or false",
        _ => "number",
    };
}
