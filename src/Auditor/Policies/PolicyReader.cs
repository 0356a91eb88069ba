using System.Globalization;
using Auditor.Yaml;

namespace Auditor.Policies;

/// <summary>
/// Reads the shipped policy, which defines every name, and lays a firm's own values over it. All problems are listed, the shipped
/// file's before the firm's; a firm's file cannot add a name, change a type or leave the range. A fixed name the shipped file lacks has
/// its default.
/// </summary>
public static class PolicyReader
{
    public static Reading<Policy> Read(string shippedYaml, string shippedFile, string? firmYaml, string? firmFile)
    {
        var problems = new List<Problem>();
        var values = new OrderedDictionary<string, PolicyValue>(StringComparer.Ordinal);
        foreach (var entry in Entries(shippedYaml, shippedFile, problems))
        {
            Take(entry, values, PolicyValues.Read(entry, null), problems);
        }

        foreach (var (name, known) in PolicyNames.Fixed)
        {
            values.TryAdd(name, known.Default);
        }

        var shipped = new OrderedDictionary<string, PolicyValue>(values, StringComparer.Ordinal);
        if (problems.Count == 0 && firmYaml is not null)
        {
            Override(Entries(firmYaml, firmFile ?? "policy", problems), values, problems);
        }

        return problems.Count == 0 ? Checked(values, shipped, firmFile ?? shippedFile) : Reading<Policy>.Failed(problems);
    }

    private static void Override(IReadOnlyList<PolicyEntry> entries, OrderedDictionary<string, PolicyValue> values, List<Problem> problems)
    {
        foreach (var entry in entries)
        {
            if (values.TryGetValue(entry.Name, out var shipped))
            {
                Take(entry, values, PolicyValues.Read(entry, shipped), problems);
            }
            else
            {
                problems.Add(entry.Problem($"unknown policy name '{entry.Name}'" + NearestName.Hint(entry.Name, values.Keys)));
            }
        }
    }

    private static void Take(
        PolicyEntry entry, OrderedDictionary<string, PolicyValue> values, Reading<PolicyValue> reading, List<Problem> problems)
    {
        problems.AddRange(reading.Problems);
        if (reading.Value is { } value)
        {
            values[entry.Name] = value;
        }
    }

    private static List<PolicyEntry> Entries(string yaml, string file, List<Problem> problems)
    {
        var found = new ProblemList(file);
        var root = YamlFile.Read(yaml, found);
        if (root is not null and not MapValue)
        {
            found.Add(root.Line, "a policy is lines of 'name: value'");
        }

        problems.AddRange(found.InOrder);
        return root is MapValue map ? [.. map.Entries.Select(entry => new PolicyEntry(file, entry))] : [];
    }

    private static Reading<Policy> Checked(
        OrderedDictionary<string, PolicyValue> values, OrderedDictionary<string, PolicyValue> shipped, string file)
    {
        var changed = new OrderedDictionary<string, object>(StringComparer.Ordinal);
        foreach (var (name, value) in shipped.Where(entry => entry.Value != values[entry.Key]))
        {
            changed[name] = value.Shown;
        }

        var policy = new Policy(values) { Overridden = changed };
        return policy.Power > policy.Significance
            ? Reading<Policy>.Of(policy)
            : Reading<Policy>.Failed(new Problem(file, null, string.Create(
                CultureInfo.InvariantCulture, $"power {policy.Power} must be above significance {policy.Significance}")));
    }
}
