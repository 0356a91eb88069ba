using System.Globalization;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace Auditor.Yaml;

/// <summary>Builds nodes from parser events, within limits.</summary>
internal sealed class YamlTree(IParser parser, ProblemList problems)
{
    public const int DeepestNesting = 64;

    public const int MostValues = 100_000;

    private readonly Dictionary<AnchorName, YamlValue?> _anchors = [];

    private readonly Stack<Mark> _openBrackets = new();

    /// <summary>Where the innermost bracket stands that is not closed yet.</summary>
    public Mark? OpenBracket => _openBrackets.TryPeek(out var open) ? open : null;

    public YamlValue? ReadDocument()
    {
        parser.Consume<StreamStart>();
        var root = parser.TryConsume<DocumentStart>(out _) ? Node(1) : null;
        if (root is null or TextValue { IsPlain: true, Text: "" })
        {
            problems.Add(1, "the file is empty");
            return null;
        }

        parser.Consume<DocumentEnd>();
        if (parser.Accept<DocumentStart>(out var second))
        {
            problems.Add(LineOf(second), "a second document starts here; expected one document a file");
        }

        return root;
    }

    private YamlValue Node(int depth)
    {
        if (parser.TryConsume<AnchorAlias>(out var alias))
        {
            return Limited(Aliased(alias), depth, alias.Start);
        }

        var start = parser.Require<NodeEvent>();
        if (!start.Anchor.IsEmpty)
        {
            _anchors[start.Anchor] = null;
        }

        RefuseTag(start);
        var node = Limited(Content(start, depth), depth, start.Start);
        if (!start.Anchor.IsEmpty)
        {
            _anchors[start.Anchor] = node;
        }

        return node;
    }

    private YamlValue Content(NodeEvent start, int depth)
    {
        if (depth > DeepestNesting)
        {
            throw new TooMuchException(start.Start, string.Create(CultureInfo.InvariantCulture, $"nested more than {DeepestNesting} levels deep"));
        }

        parser.MoveNext();
        return start switch
        {
            Scalar scalar => Text(scalar),
            SequenceStart list => new ListValue(InBrackets(list.Style == SequenceStyle.Flow, list, () => Items(depth)), LineOf(list)),
            _ => new MapValue(InBrackets(((MappingStart)start).Style == MappingStyle.Flow, start, () => Entries(depth)), LineOf(start)),
        };
    }

    private TextValue Text(Scalar scalar)
    {
        if (scalar.Value.Any(YamlCharacters.IsForbidden))
        {
            problems.Add(LineOf(scalar), "a control character cannot stand in a text");
        }

        return new TextValue(scalar.Value, scalar.Style == ScalarStyle.Plain, LineOf(scalar));
    }

    private T InBrackets<T>(bool brackets, NodeEvent start, Func<T> content)
    {
        if (!brackets)
        {
            return content();
        }

        _openBrackets.Push(start.Start);
        var read = content();
        _openBrackets.Pop();
        return read;
    }

    private List<YamlValue> Items(int depth)
    {
        var items = new List<YamlValue>();
        while (!parser.TryConsume<SequenceEnd>(out _))
        {
            items.Add(Node(depth + 1));
        }

        return items;
    }

    private List<MapEntry> Entries(int depth)
    {
        var entries = new Dictionary<string, MapEntry>(StringComparer.Ordinal);
        while (!parser.TryConsume<MappingEnd>(out _))
        {
            var key = Node(depth + 1);
            var value = Node(depth + 1);
            if (KeyText(key) is { } text && !entries.TryAdd(text, new MapEntry(text, key.Line, value)))
            {
                problems.Add(key.Line, string.Create(CultureInfo.InvariantCulture, $"the key '{Words.Short(text)}' stands twice, first on line {entries[text].Line}"));
            }
        }

        return [.. entries.Values];
    }

    private string? KeyText(YamlValue key)
    {
        switch (key)
        {
            case TextValue { IsPlain: true, Text: "<<" }:
                problems.Add(key.Line, "merging with '<<' is not supported; write the keys out");
                return null;
            case TextValue text:
                return text.Text;
            default:
                problems.Add(key.Line, "expected a text as a key, found " + Words.Found(key));
                return null;
        }
    }

    private YamlValue Aliased(AnchorAlias alias)
    {
        if (!_anchors.TryGetValue(alias.Value, out var node))
        {
            problems.Add(LineOf(alias), $"the alias '*{Words.Short(alias.Value.Value)}' has no anchor before it");
        }
        else if (node is null)
        {
            problems.Add(LineOf(alias), $"the anchor '&{Words.Short(alias.Value.Value)}' contains itself");
        }

        return node ?? new TextValue("*" + alias.Value.Value, IsPlain: false, LineOf(alias));
    }

    private static YamlValue Limited(YamlValue node, int depth, Mark at)
    {
        if (node.Depth + depth - 1 > DeepestNesting)
        {
            throw new TooMuchException(at, string.Create(CultureInfo.InvariantCulture, $"nested more than {DeepestNesting} levels deep"));
        }

        return node.Size > MostValues
            ? throw new TooMuchException(at, string.Create(CultureInfo.InvariantCulture, $"more than {MostValues} values, aliases written out"))
            : node;
    }

    private void RefuseTag(NodeEvent node)
    {
        if (!node.Tag.IsEmpty && !node.Tag.IsNonSpecific)
        {
            problems.Add(LineOf(node), "a tag has no meaning here; leave out what starts with '!', or put it in quotation marks");
        }
    }

    private static int LineOf(ParsingEvent parsed) => (int)parsed.Start.Line;
}
