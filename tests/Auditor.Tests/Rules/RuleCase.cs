using System.Globalization;
using Auditor.Facts;
using Auditor.Rules;
using YamlDotNet.RepresentationModel;

namespace Auditor.Tests.Rules;

/// <summary>Facts in, and what one rule must give: a row of rules/cases/*.yaml.</summary>
/// <param name="Gives">finding, nothing or undecided.</param>
/// <param name="Message">The finding's whole message, when the case states it.</param>
public sealed record RuleCase(Rule Rule, string Case, FactSet Facts, string Gives, string? Message)
{
    private static readonly string[] Keys = ["rule", "case", "facts", "gives", "message"];

    public static IReadOnlyList<RuleCase> ReadAll(IReadOnlyList<Rule> rules) =>
        [.. ShippedFiles.All("cases").SelectMany(file => ReadFile(file.Yaml, rules.ToDictionary(rule => rule.Id)))];

    private static IEnumerable<RuleCase> ReadFile(string yaml, Dictionary<string, Rule> rules)
    {
        var stream = new YamlStream();
        stream.Load(new StringReader(yaml));
        return ((YamlSequenceNode)stream.Documents.Single().RootNode).Select(node => ReadOne((YamlMappingNode)node, rules));
    }

    private static RuleCase ReadOne(YamlMappingNode node, Dictionary<string, Rule> rules)
    {
        Assert.All(node.Children.Keys, key => Assert.Contains(((YamlScalarNode)key).Value, Keys));
        var rule = rules[Text(node["rule"])];
        var given = ((YamlMappingNode)node["facts"]).Children.ToDictionary(pair => Text(pair.Key), pair => pair.Value);
        Assert.All(given.Keys, name => Assert.NotNull(FactCatalogue.Find(rule.About, name)));
        var values = FactCatalogue.Of(rule.About).ToDictionary(fact => fact.Name, fact => Value(fact, given.GetValueOrDefault(fact.Name)));
        var message = node.Children.TryGetValue("message", out var words) ? Text(words) : null;
        return new RuleCase(rule, Text(node["case"]), new FactSet(rule.About, "subject", null, values), Text(node["gives"]), message);
    }

    private static FactValue Value(FactDefinition fact, YamlNode? node) => node switch
    {
        null => new FactValue.NotComputable("not named in the case"),
        YamlMappingNode reason => new FactValue.NotComputable(Text(reason["why"])),
        _ => fact.Type switch
        {
            FactType.Number => new FactValue.Number(double.Parse(Text(node), CultureInfo.InvariantCulture)),
            FactType.Count => new FactValue.Count(long.Parse(Text(node), CultureInfo.InvariantCulture)),
            FactType.Flag => new FactValue.Flag(bool.Parse(Text(node))),
            _ => new FactValue.Text(Word(fact, Text(node))),
        },
    };

    private static string Word(FactDefinition fact, string text)
    {
        Assert.True(fact.Words.Count == 0 || fact.Words.Contains(text), $"{fact.Name} is never '{text}'");
        return text;
    }

    private static string Text(YamlNode node) => ((YamlScalarNode)node).Value!;
}
