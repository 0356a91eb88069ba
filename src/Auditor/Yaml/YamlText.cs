using YamlDotNet.Core;
using YamlDotNet.Core.Events;
using YamlDotNet.RepresentationModel;

namespace Auditor.Yaml;

/// <summary>
/// Text to one YAML node tree with positions, or the problem that kept it from being one. Aliases, second documents and
/// nesting beyond any use are refused before a tree is built, so what comes out is finite and small enough to walk.
/// </summary>
internal static class YamlText
{
    private const int DeepestNesting = 32;

    public static Reading<YamlNode> Load(string text, string file)
    {
        var parser = new Parser(new StringReader(text));
        try
        {
            return Refusal(parser, file) is { } refused ? Reading<YamlNode>.Failed(refused) : Tree(text, file);
        }
        catch (YamlException fault)
        {
            return Reading<YamlNode>.Failed(new Problem(file, Line(fault.Start), "not valid YAML: " + fault.Message));
        }
        catch (InvalidOperationException)
        {
            // An unclosed bracket before a line with a colon: the parser loses its place and gives no position.
            return Reading<YamlNode>.Failed(
                new Problem(file, parser.Current is { } last ? Line(last.End) : null, "not valid YAML: a bracket or brace is not closed"));
        }
    }

    /// <summary>The 1-based line where the node starts.</summary>
    public static int Line(YamlNode node) => Line(node.Start);

    private static Reading<YamlNode> Tree(string text, string file)
    {
        var stream = new YamlStream();
        stream.Load(new StringReader(text));
        return stream.Documents.Count == 0
            ? Reading<YamlNode>.Failed(new Problem(file, null, "the file is empty"))
            : Reading<YamlNode>.Of(stream.Documents[0].RootNode);
    }

    private static Problem? Refusal(Parser parser, string file)
    {
        var depth = 0;
        var documents = 0;
        while (parser.MoveNext())
        {
            var now = parser.Current!;
            depth += now.NestingIncrease;
            documents += now is DocumentStart ? 1 : 0;
            if (Refused(now, depth, documents) is { } why)
            {
                return new Problem(file, Line(now.Start), why);
            }
        }

        return null;
    }

    private static string? Refused(ParsingEvent now, int depth, int documents) => now switch
    {
        AnchorAlias alias => $"'*{alias.Value}' repeats another part of the file; write the value out",
        DocumentStart when documents > 1 => "a second document starts here; only one a file is read",
        _ when depth > DeepestNesting => "nested too deeply",
        _ => null,
    };

    private static int Line(in Mark mark) => (int)mark.Line;
}
