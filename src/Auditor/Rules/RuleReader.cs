using Auditor.Facts;
using Auditor.Findings;
using Auditor.Policies;
using Auditor.Yaml;

namespace Auditor.Rules;

/// <summary>
/// Reads rule files, strictly: whatever a rule names must exist and fit, so that a rule that was read can only hold, not hold, or
/// lack a fact. All problems of all files are listed.
/// </summary>
public static class RuleReader
{
    private static readonly string[] Keys = ["id", "about", "when", "severity", "message", "advice", "source"];

    /// <param name="files">Name and text of every rule file, in the order the rules are to have; not the policy.</param>
    /// <param name="policy">The policy whose names the rules use.</param>
    public static Reading<IReadOnlyList<Rule>> Read(IReadOnlyList<(string File, string Yaml)> files, Policy policy)
    {
        var rules = new List<Rule>();
        var problems = new List<Problem>();
        foreach (var (file, yaml) in files)
        {
            var found = new ProblemList(file);
            if (YamlFile.Read(yaml, found) is { } root)
            {
                rules.AddRange(Rules(root, file, policy, found));
            }

            problems.AddRange(found.InOrder);
        }

        problems.AddRange(Repeated(rules));
        return problems.Count == 0 ? Reading<IReadOnlyList<Rule>>.Of(rules) : Reading<IReadOnlyList<Rule>>.Failed(problems);
    }

    private static List<Rule> Rules(YamlValue root, string file, Policy policy, ProblemList problems)
    {
        if (root is not ListValue rows)
        {
            problems.Add(root.Line, "a rule file is a list of rules, each starting with '- id:'");
            return [];
        }

        return rows.Items.Select(row => Rule(row, file, policy, problems)).OfType<Rule>().ToList();
    }

    private static Rule? Rule(YamlValue row, string file, Policy policy, ProblemList problems)
    {
        if (RuleMap.Read(row, "a rule", Keys, problems) is not { } map || map.Text("id", "a rule") is not { } id)
        {
            return null;
        }

        var what = $"rule '{id}'";
        var about = About(map, what, problems);
        var severity = Severity(map, what, problems);
        var source = map.Text("source", what);
        var when = about is About kind ? new ConditionReader(kind, policy, problems).Read(map, what) : null;
        var message = Template(map, "message", what, about, policy, problems);
        var advice = Template(map, "advice", what, about, policy, problems);
        CheckId(id, map, problems);
        return about is About subject && when is not null && severity is Severity grave && message is not null && advice is not null && source is not null
            ? new Rule(id, subject, when, grave, message, advice, source, file, row.Line)
            : null;
    }

    private static void CheckId(string id, RuleMap map, ProblemList problems)
    {
        if (!id.All(letter => char.IsAsciiLetterLower(letter) || char.IsAsciiDigit(letter) || letter == '-'))
        {
            problems.Add(map.Get("id")!.Line, $"rule id '{id}' may hold small letters, digits and hyphens only");
        }
    }

    private static About? About(RuleMap map, string what, ProblemList problems)
    {
        var word = map.Text("about", what);
        var about = word is null ? null : AboutWords.Parse(word);
        if (word is not null && about is null)
        {
            problems.Add(map.Get("about")!.Line, $"'about' of {what} cannot be '{word}'" + NearestName.Hint(word, AboutWords.All));
        }

        return about;
    }

    private static Severity? Severity(RuleMap map, string what, ProblemList problems)
    {
        var word = map.Text("severity", what);
        if (word is null)
        {
            return null;
        }

        if (ComparisonWords.Severities.TryGetValue(word, out var severity))
        {
            return severity;
        }

        problems.Add(map.Get("severity")!.Line, $"'severity' of {what} cannot be '{word}'" + NearestName.Hint(word, ComparisonWords.Severities.Keys));
        return null;
    }

    private static MessageTemplate? Template(RuleMap map, string key, string what, About? about, Policy policy, ProblemList problems)
    {
        if (map.Text(key, what) is not { } text)
        {
            return null;
        }

        var template = MessageTemplate.Parse(text);
        if (template is null)
        {
            problems.Add(map.Get(key)!.Line, $"'{key}' of {what} has a brace without its partner; write {{{{ or }}}} for the sign itself");
        }
        else if (about is About kind)
        {
            CheckNames(template, map.Get(key)!, $"'{key}' of {what}", kind, policy, problems);
        }

        return template;
    }

    private static void CheckNames(MessageTemplate template, YamlValue at, string where, About about, Policy policy, ProblemList problems)
    {
        foreach (var name in template.Names)
        {
            var wrong = name.StartsWith(ComparisonWords.PolicyPrefix, StringComparison.Ordinal)
                ? KnownNames.UnknownPolicy(name, policy)
                : KnownNames.UnknownFact(about, name);
            if (wrong is not null)
            {
                problems.Add(at.Line, $"{where}: {wrong}");
            }
        }
    }

    private static List<Problem> Repeated(List<Rule> rules)
    {
        var first = new Dictionary<string, Rule>(StringComparer.Ordinal);
        return rules
            .Where(rule => !first.TryAdd(rule.Id, rule))
            .Select(rule => new Problem(rule.File, rule.Line, $"rule id '{rule.Id}' is already used at {first[rule.Id].File}:{first[rule.Id].Line}"))
            .ToList();
    }
}
