using Auditor.Findings;
using Auditor.Rules;
using Auditor.Yaml;

namespace Auditor.Acceptances;

/// <summary>
/// Reads an acceptances file, strictly: all problems are listed. What an entry names must exist, so that a misspelt rule does not pass for an
/// acceptance that is not needed any more. No entry can be about a finding on acceptances: an acceptance that lapsed cannot be accepted away.
/// </summary>
public static class AcceptanceReader
{
    /// <summary>The only format version there is.</summary>
    private const string Version = "1";

    private const string Document = "acceptances file";

    /// <param name="yaml">The text of the file.</param>
    /// <param name="file">Its name, for messages.</param>
    /// <param name="rules">The rules in force.</param>
    public static Reading<IReadOnlyList<AcceptanceEntry>> Read(string yaml, string file, IReadOnlyList<Rule> rules)
    {
        var problems = new ProblemList(file);
        var root = YamlFile.Read(yaml, problems);
        var entries = root is null ? null : Entries(Place.Document(root, Document, problems), rules);
        return problems.Any || entries is null
            ? Reading<IReadOnlyList<AcceptanceEntry>>.Failed(problems.InOrder)
            : Reading<IReadOnlyList<AcceptanceEntry>>.Of(entries);
    }

    private static List<AcceptanceEntry>? Entries(Place root, IReadOnlyList<Rule> rules)
    {
        if (Keys.Of(root, "acceptances", "accept") is not { } keys)
        {
            return null;
        }

        if (keys.Required("acceptances", "acceptances: 1, the version of this format") is { } version
            && version.Node is not TextValue { Text: Version })
        {
            version.Refuse("1, the only version of this format");
        }

        var reader = new AcceptanceEntryReader(rules);
        var entries = keys.Required("accept", "a list of accepted findings")?.Items("accepted findings")?.Select(item => (item, Entry: reader.Read(item))).ToList();
        RefuseRepeated(entries ?? []);
        return entries?.Select(entry => entry.Entry).OfType<AcceptanceEntry>().ToList();
    }

    private static void RefuseRepeated(List<(Place Item, AcceptanceEntry? Entry)> entries)
    {
        var first = new Dictionary<(string, string, string, string), AcceptanceEntry>();
        foreach (var (item, entry) in entries)
        {
            if (entry is not null && !first.TryAdd((entry.Rule, entry.Subject, entry.Model, entry.Version), entry))
            {
                var line = first[(entry.Rule, entry.Subject, entry.Model, entry.Version)].Line;
                item.Add(string.Create(
                    System.Globalization.CultureInfo.InvariantCulture,
                    $"the finding '{entry.Rule}' on '{Words.Short(entry.Subject)}' of this model and version is accepted twice, first on line {line}; keep one"));
            }
        }
    }
}
