using Auditor.Facts;
using Auditor.Policies;
using Auditor.Yaml;

namespace Auditor.Rules;

/// <summary>Reads the <c>when</c> of one rule.</summary>
internal sealed class ConditionReader(About about, Policy policy, ProblemList problems)
{
    private const string What = "a condition";

    private static readonly string[] Keys = ["fact", .. ComparisonWords.Comparisons.Keys];

    private static readonly string[] AllKeys = [.. Keys, "any"];

    /// <returns>Null when there is a problem.</returns>
    public IReadOnlyList<Condition>? Read(RuleMap rule, string what)
    {
        if (rule.Get("when") is not ListValue { Items.Count: > 0 } lines)
        {
            problems.Add(rule.Get("when")?.Line ?? rule.Line, $"'when' of {what} must be a list of one condition or more");
            return null;
        }

        return Complete(lines.Items, Condition);
    }

    private static List<T>? Complete<T>(IEnumerable<YamlValue> nodes, Func<YamlValue, T?> read)
        where T : class
    {
        var all = nodes.Select(read).ToList();
        return all.Contains(null) ? null : [.. all.OfType<T>()];
    }

    private Condition? Condition(YamlValue node)
    {
        var map = RuleMap.Read(node, What, AllKeys, problems);
        return map is null ? null : map.Get("any") is { } any ? Any(map, any) : Test(map);
    }

    private AnyCondition? Any(RuleMap map, YamlValue any)
    {
        if (map.Keys.Count > 1 || any is not ListValue { Items.Count: > 0 } alternatives)
        {
            problems.Add(any.Line, "'any' stands alone and holds a list of conditions");
            return null;
        }

        return Complete(alternatives.Items, node => RuleMap.Read(node, What, Keys, problems) is { } one ? Test(one) : null) is { } tests
            ? new AnyCondition(tests)
            : null;
    }

    private FactCondition? Test(RuleMap map)
    {
        var name = map.Text("fact", What);
        var comparisons = map.Keys.Where(ComparisonWords.Comparisons.ContainsKey).ToList();
        if (comparisons.Count != 1)
        {
            problems.Add(map.Line, "a condition has exactly one of " + string.Join(", ", ComparisonWords.Comparisons.Keys));
        }

        if (name is not null && KnownNames.UnknownFact(about, name) is { } unknown)
        {
            problems.Add(map.Get("fact")!.Line, unknown);
            return null;
        }

        return name is null || comparisons.Count != 1 ? null : Test(FactCatalogue.Find(about, name)!, comparisons[0], map.Get(comparisons[0])!);
    }

    private FactCondition? Test(FactDefinition fact, string word, YamlValue right)
    {
        var comparison = ComparisonWords.Comparisons[word];
        if (comparison.BySize() && fact.Type is FactType.Text or FactType.Flag)
        {
            problems.Add(right.Line, $"'{word}' compares numbers, and {fact.Name} is a {TypeWord(fact.Type)}");
            return null;
        }

        var nodes = comparison == Comparison.OneOf ? Several(fact, right) : [right];
        return nodes is not null && Complete(nodes, node => Operand(fact, comparison, word, node)) is { } operands
            ? new FactCondition(fact, comparison, operands)
            : null;
    }

    private IReadOnlyList<YamlValue>? Several(FactDefinition fact, YamlValue right)
    {
        if (right is ListValue { Items.Count: > 0 } list)
        {
            return [.. list.Items];
        }

        problems.Add(right.Line, $"'one_of' for {fact.Name} needs a list");
        return null;
    }

    private Operand? Operand(FactDefinition fact, Comparison comparison, string word, YamlValue node)
    {
        if (node is not TextValue scalar)
        {
            problems.Add(node.Line, $"'{word}' for {fact.Name} needs one value");
            return null;
        }

        var type = comparison == Comparison.Present ? FactType.Flag : fact.Type;
        return scalar.IsPlain && scalar.Text.StartsWith(ComparisonWords.PolicyPrefix, StringComparison.Ordinal)
            ? FromPolicy(fact, type, scalar)
            : Written(fact, type, word, scalar);
    }

    private Operand? FromPolicy(FactDefinition fact, FactType type, TextValue scalar)
    {
        var reference = scalar.Text;
        if (KnownNames.UnknownPolicy(reference, policy) is { } unknown)
        {
            problems.Add(scalar.Line, unknown);
            return null;
        }

        var name = reference[ComparisonWords.PolicyPrefix.Length..];
        policy.TryGet(name, out var value);
        if (Fits(value!.AsFact(), type))
        {
            return new Operand(null, name);
        }

        problems.Add(scalar.Line, $"{reference} does not fit {fact.Name}, which is a {TypeWord(type)}");
        return null;
    }

    private Operand? Written(FactDefinition fact, FactType type, string word, TextValue scalar)
    {
        FactValue value = type switch
        {
            FactType.Text => FactValue.Of(scalar.Text, ""),
            FactType.Flag => FactValue.Of(scalar.Flag(), "true or false"),
            _ => FactValue.Of(scalar.Number(), "a number"),
        };
        if (value is FactValue.NotComputable wanted)
        {
            problems.Add(scalar.Line, $"'{word}' for {fact.Name} needs {wanted.Why}, found '{scalar.Text}'");
            return null;
        }

        if (value is FactValue.Text { Value: var text } && fact.Words.Count > 0 && !fact.Words.Contains(text))
        {
            problems.Add(scalar.Line, $"{fact.Name} is never '{text}'" + NearestName.Hint(text, fact.Words));
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
