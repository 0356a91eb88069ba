using YamlDotNet.RepresentationModel;

namespace Auditor.Yaml;

/// <summary>Problems of one file, collected.</summary>
internal sealed class YamlProblems(string file)
{
    private readonly List<Problem> _found = [];

    public string File { get; } = file;

    public IReadOnlyList<Problem> Found => _found;

    public void Add(YamlNode at, string message) => _found.Add(new Problem(File, YamlText.Line(at), message));
}

/// <summary>A mapping whose keys are known beforehand: any other key is a problem with the nearest known one.</summary>
internal sealed class RuleMap
{
    private readonly Dictionary<string, YamlNode> _values = new(StringComparer.Ordinal);

    private RuleMap(YamlNode node) => Node = node;

    public YamlNode Node { get; }

    public IReadOnlyCollection<string> Keys => _values.Keys;

    /// <param name="what">What the mapping describes, for messages.</param>
    /// <returns>Null when the node is no mapping.</returns>
    public static RuleMap? Read(YamlNode node, string what, IReadOnlyList<string> known, YamlProblems problems)
    {
        if (node is not YamlMappingNode mapping)
        {
            problems.Add(node, $"{what} must be 'key: value' pairs");
            return null;
        }

        var map = new RuleMap(node);
        foreach (var (key, value) in mapping.Children)
        {
            map.Take(key, value, what, known, problems);
        }

        return map;
    }

    public YamlNode? Get(string key) => _values.GetValueOrDefault(key);

    /// <summary>The text under the key; a problem when it is missing, empty or no text.</summary>
    public string? Text(string key, string what, YamlProblems problems)
    {
        var node = Get(key);
        if (node is YamlScalarNode scalar && !string.IsNullOrWhiteSpace(scalar.Value))
        {
            return YamlScalars.Text(scalar).Trim();
        }

        problems.Add(node ?? Node, node is null ? $"{what} lacks '{key}'" : $"'{key}' of {what} must be a text");
        return null;
    }

    private void Take(YamlNode key, YamlNode value, string what, IReadOnlyList<string> known, YamlProblems problems)
    {
        var name = key is YamlScalarNode scalar ? YamlScalars.Text(scalar) : key.ToString();
        if (known.Contains(name))
        {
            _values[name] = value;
        }
        else
        {
            problems.Add(key, $"unknown key '{name}' of {what}" + NearestName.Hint(name, known));
        }
    }
}
