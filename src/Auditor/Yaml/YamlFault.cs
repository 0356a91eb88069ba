using System.Globalization;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace Auditor.Yaml;

/// <summary>Says in plain words why a text is not YAML.</summary>
internal static class YamlFault
{
    public static void Explain(string yaml, YamlException fault, Mark? openBracket, ProblemList problems)
    {
        var line = (int)Math.Max(1, fault.Start.Line);
        if (fault is TooMuchException)
        {
            problems.Add(line, fault.Message);
        }
        else if (IndentedByTab(yaml, line) is int tabbed)
        {
            problems.Add(tabbed, "a tab cannot indent YAML; use spaces");
        }
        else if (openBracket is { } open)
        {
            problems.Add((int)open.Line, Unclosed(open));
        }
        else
        {
            problems.Add(line, "this is not YAML: " + Plain(fault));
        }
    }

    public static void Explain(string yaml, ParsingEvent? last, Mark? openBracket, ProblemList problems)
    {
        var at = openBracket ?? last?.End ?? Mark.Empty;
        Explain(yaml, new YamlException(at, at, "it ends unexpectedly."), openBracket, problems);
    }

    private static string Unclosed(Mark open) =>
        string.Create(CultureInfo.InvariantCulture, $"the bracket that opens in column {open.Column} is not closed, or what stands in it is not YAML");

    /// <summary>The faulty line, or the one after it (where the parser stops at a key before it), when its indentation holds a tab.</summary>
    private static int? IndentedByTab(string yaml, int line) =>
        new[] { line, line + 1 }.Where(number => Indentation(YamlCharacters.Line(yaml, number)).Contains('\t', StringComparison.Ordinal)).Cast<int?>().FirstOrDefault();

    private static string Indentation(string line) => line[..^line.TrimStart().Length];

    private static string Plain(YamlException fault) => fault.Message switch
    {
        var words when words.Contains("quoted scalar, found unexpected end", StringComparison.Ordinal) => "the quotation mark is not closed",
        var words when words.Contains("unknown escape", StringComparison.Ordinal) => "a backslash in double quotation marks must be written twice",
        var words when words.Contains("found invalid mapping", StringComparison.Ordinal) => "a second colon on a line, or a deeper line under a key that already has a value; put text with a colon in quotation marks",
        var words when words.Contains("cannot start any token", StringComparison.Ordinal) => "text cannot start with this character; put it in quotation marks",
        var words when words.Contains("did not find expected key", StringComparison.Ordinal) => "expected a key here; is the indentation the same as above?",
        var words when words.Contains("expected '-'", StringComparison.Ordinal) => "expected the next '-' of the list; is the indentation the same as above, with a space after the '-'?",
        var words => words,
    };
}

/// <summary>YAML that is well formed, yet nests or multiplies beyond what a person would write.</summary>
internal sealed class TooMuchException(Mark at, string message) : YamlException(at, at, message);
