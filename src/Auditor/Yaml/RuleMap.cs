namespace Auditor.Yaml;

/// <summary>A map of a rule file, whose keys are known beforehand: any other key is a problem with the nearest known one.</summary>
internal sealed class RuleMap
{
    private readonly Dictionary<string, YamlValue> _values = new(StringComparer.Ordinal);
    private readonly ProblemList _problems;

    private RuleMap(int line, ProblemList problems) => (Line, _problems) = (line, problems);

    public int Line { get; }

    public IReadOnlyCollection<string> Keys => _values.Keys;

    /// <param name="what">What the map describes, for messages.</param>
    /// <returns>Null when the node is no map.</returns>
    public static RuleMap? Read(YamlValue node, string what, IReadOnlyList<string> known, ProblemList problems)
    {
        if (node is not MapValue { Entries: var entries })
        {
            problems.Add(node.Line, $"{what} must be 'key: value' pairs");
            return null;
        }

        var map = new RuleMap(node.Line, problems);
        foreach (var entry in entries)
        {
            map.Take(entry, what, known);
        }

        return map;
    }

    public YamlValue? Get(string key) => _values.GetValueOrDefault(key);

    /// <summary>The text under the key; a problem when it is missing, empty or no text.</summary>
    public string? Text(string key, string what)
    {
        var node = Get(key);
        if (node is TextValue scalar && !string.IsNullOrWhiteSpace(scalar.Text))
        {
            return scalar.Text.Trim();
        }

        _problems.Add(node?.Line ?? Line, node is null ? $"{what} lacks '{key}'" : $"'{key}' of {what} must be a text");
        return null;
    }

    private void Take(MapEntry entry, string what, IReadOnlyList<string> known)
    {
        if (known.Contains(entry.Key))
        {
            // A key with nothing after it is reported where the key stands.
            _values[entry.Key] = entry.Value is TextValue { IsPlain: true, Text: "" } nothing ? nothing with { Line = entry.Line } : entry.Value;
        }
        else
        {
            _problems.Add(entry.Line, $"unknown key '{Words.Short(entry.Key)}' of {what}" + NearestName.Hint(entry.Key, known));
        }
    }
}
