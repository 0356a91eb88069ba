using System.Globalization;
using YamlDotNet.Core;

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
        else if (IndentedByTab(yaml, line, fault) is int tabbed)
        {
            problems.Add(tabbed, "a tab cannot indent YAML; use spaces");
        }
        else if (PlainText(fault) is { } reason)
        {
            problems.Add(line, "this is not YAML: " + reason);
        }
        else if (openBracket is { } open)
        {
            problems.Add((int)open.Line, Unclosed(open));
        }
        else
        {
            problems.Add(line, "this is not YAML: " + PlainStructure(fault));
        }
    }

    private static string Unclosed(Mark open) =>
        string.Create(CultureInfo.InvariantCulture, $"the bracket that opens in column {open.Column} is not closed, or what stands in it is not YAML");

    /// <summary>
    /// The first line whose indentation holds a tab: from the line of the fault on when the parser names the tab (it may name the line where the
    /// whole map starts), else the faulty line or the one after it.
    /// </summary>
    private static int? IndentedByTab(string yaml, int line, YamlException fault)
    {
        var lines = yaml.ReplaceLineEndings("\n").Split('\n');
        var last = Says(fault, "tab") ? lines.Length : Math.Min(lines.Length, line + 1);
        return Enumerable.Range(line, Math.Max(0, last - line + 1)).Where(number => Indentation(lines[number - 1]).Contains('\t', StringComparison.Ordinal)).Cast<int?>().FirstOrDefault();
    }

    private static string Indentation(string line) => line[..^line.TrimStart().Length];

    /// <summary>What is wrong with a text, whatever it stands in.</summary>
    private static string? PlainText(YamlException fault) =>
        Says(fault, "unknown escape") ? "a backslash in double quotation marks must be written twice"
        : Says(fault, "quoted scalar") ? "the quotation mark is not closed"
        : Says(fault, "cannot start any token") ? "text cannot start with this character; put it in quotation marks"
        : null;

    /// <summary>What is wrong outside brackets.</summary>
    private static string PlainStructure(YamlException fault) =>
        Says(fault, "found invalid mapping") ? "a second colon on a line, or a deeper line under a key that already has a value; put text with a colon in quotation marks"
        : Says(fault, "did not find expected key") || Says(fault, "expected '-'") ? "expected a key, or '-' and a space; is the indentation the same as above?"
        : fault.Message;

    private static bool Says(YamlException fault, string words) => fault.Message.Contains(words, StringComparison.Ordinal);
}

/// <summary>YAML that is well formed, yet nests or multiplies beyond what a person would write.</summary>
internal sealed class TooMuchException(Mark at, string message) : YamlException(at, at, message);
