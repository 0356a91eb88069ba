using Auditor.Facts;
using Auditor.Yaml;
using YamlDotNet.RepresentationModel;

namespace Auditor.Rules;

/// <summary>Reads the <c>when</c> of one rule.</summary>
internal sealed class ConditionReader(About about, Policy policy, YamlProblems problems)
{
    private const string What = "a condition";

    private static readonly string[] Keys = ["fact", .. ComparisonWords.Comparisons.Keys];

    private static readonly string[] AllKeys = [.. Keys, "any"];

    /// <returns>Null when there is a problem.</returns>
    public IReadOnlyList<Condition>? Read(RuleMap rule, string what)
    {
        if (rule.Get("when") is not YamlSequenceNode { Children.Count: > 0 } lines)
        {
            problems.Add(rule.Get("when") ?? rule.Node, $"'when' of {what} must be a list of one condition or more");
            return null;
        }

        return Complete(lines, Condition);
    }

    private static List<T>? Complete<T>(IEnumerable<YamlNode> nodes, Func<YamlNode, T?> read)
        where T : class
    {
        var all = nodes.Select(read).ToList();
        return all.Contains(null) ? null : [.. all.OfType<T>()];
    }

    private Condition? Condition(YamlNode node)
    {
        var map = RuleMap.Read(node, What, AllKeys, problems);
        return map is null ? null : map.Get("any") is { } any ? Any(map, any) : Test(map);
    }

    private AnyCondition? Any(RuleMap map, YamlNode any)
    {
        if (map.Keys.Count > 1 || any is not YamlSequenceNode { Children.Count: > 0 } alternatives)
        {
            problems.Add(any, "'any' stands alone and holds a list of conditions");
            return null;
        }

        return Complete(alternatives, node => RuleMap.Read(node, What, Keys, problems) is { } one ? Test(one) : null) is { } tests
            ? new AnyCondition(tests)
            : null;
    }

    private FactCondition? Test(RuleMap map)
    {
        var name = map.Text("fact", What, problems);
        var comparisons = map.Keys.Where(ComparisonWords.Comparisons.ContainsKey).ToList();
        if (comparisons.Count != 1)
        {
            problems.Add(map.Node, "a condition has exactly one of " + string.Join(", ", ComparisonWords.Comparisons.Keys));
        }

        if (name is not null && KnownNames.UnknownFact(about, name) is { } unknown)
        {
            problems.Add(map.Get("fact")!, unknown);
            return null;
        }

        return name is null || comparisons.Count != 1 ? null : Test(FactCatalogue.Find(about, name)!, comparisons[0], map.Get(comparisons[0])!);
    }

    private FactCondition? Test(FactDefinition fact, string word, YamlNode right)
    {
        var comparison = ComparisonWords.Comparisons[word];
        if (comparison.BySize() && fact.Type is FactType.Text or FactType.Flag)
        {
            problems.Add(right, $"'{word}' compares numbers, and {fact.Name} is a {TypeWord(fact.Type)}");
            return null;
        }

        var nodes = comparison == Comparison.OneOf ? Several(fact, right) : [right];
        return nodes is not null && Complete(nodes, node => Operand(fact, comparison, word, node)) is { } operands
            ? new FactCondition(fact, comparison, operands)
            : null;
    }

    private IReadOnlyList<YamlNode>? Several(FactDefinition fact, YamlNode right)
    {
        if (right is YamlSequenceNode { Children.Count: > 0 } list)
        {
            return [.. list.Children];
        }

        problems.Add(right, $"'one_of' for {fact.Name} needs a list");
        return null;
    }

    private Operand? Operand(FactDefinition fact, Comparison comparison, string word, YamlNode node)
    {
        if (node is not YamlScalarNode scalar)
        {
            problems.Add(node, $"'{word}' for {fact.Name} needs one value");
            return null;
        }

        var type = comparison == Comparison.Present ? FactType.Flag : fact.Type;
        return YamlScalars.IsPlain(scalar) && YamlScalars.Text(scalar).StartsWith(ComparisonWords.PolicyPrefix, StringComparison.Ordinal)
            ? FromPolicy(fact, type, scalar)
            : Written(fact, type, word, scalar);
    }

    private Operand? FromPolicy(FactDefinition fact, FactType type, YamlScalarNode scalar)
    {
        var reference = YamlScalars.Text(scalar);
        if (KnownNames.UnknownPolicy(reference, policy) is { } unknown)
        {
            problems.Add(scalar, unknown);
            return null;
        }

        var name = reference[ComparisonWords.PolicyPrefix.Length..];
        policy.TryGet(name, out var value);
        if (Fits(value!.AsFact(), type))
        {
            return new Operand(null, name);
        }

        problems.Add(scalar, $"{reference} does not fit {fact.Name}, which is a {TypeWord(type)}");
        return null;
    }

    private Operand? Written(FactDefinition fact, FactType type, string word, YamlScalarNode scalar)
    {
        FactValue value = type switch
        {
            FactType.Text => FactValue.Of(YamlScalars.Text(scalar), ""),
            FactType.Flag => FactValue.Of(YamlScalars.Flag(scalar), "true or false"),
            _ => FactValue.Of(YamlScalars.Number(scalar), "a number"),
        };
        if (value is FactValue.NotComputable wanted)
        {
            problems.Add(scalar, $"'{word}' for {fact.Name} needs {wanted.Why}, found '{scalar.Value}'");
            return null;
        }

        if (value is FactValue.Text { Value: var text } && fact.Words.Count > 0 && !fact.Words.Contains(text))
        {
            problems.Add(scalar, $"{fact.Name} is never '{text}'" + NearestName.Hint(text, fact.Words));
            return null;
        }

        return new Operand(value, null);
    }

    private static bool Fits(FactValue value, FactType type) => value switch
    {
        FactValue.Flag => type == FactType.Flag,
        FactValue.Text => type == FactType.Text,
        _ => type is FactType.Number or FactType.Count,
    };

    private static string TypeWord(FactType type) => type switch
    {
        FactType.Flag => "flag (true or false)",
        FactType.Text => "text",
        FactType.Count => "count",
        _ => "number",
    };
}
