using System.Text.RegularExpressions;

namespace Auditor.Cli.Tests;

/// <summary>
/// The examples of a README: a yaml block whose first line names its file (<c># leases.yaml</c>), a csv block after a paragraph that names its file in
/// backquotes, and commands that begin with <c>./run-audit.sh</c>, in sh blocks or in backquotes within the text.
/// </summary>
internal sealed partial record ReadmeFile(IReadOnlyList<(string Name, string Text)> Files, IReadOnlyList<string> Commands)
{
    private const string Program = "./run-audit.sh";

    public static ReadmeFile Read(string markdown)
    {
        var blocks = Block().Matches(markdown).Select(match => (Before: markdown[..match.Index], Language: match.Groups[1].Value, Text: match.Groups[2].Value)).ToList();
        var yaml = blocks.Where(block => block.Language == "yaml" && block.Text.StartsWith("# ", StringComparison.Ordinal))
            .Select(block => (block.Text.Split('\n')[0][2..].Trim(), block.Text));
        var csv = blocks.Where(block => block.Language == "csv").Select(block => (CsvName().Matches(block.Before)[^1].Groups[1].Value, block.Text));
        var lines = blocks.Where(block => block.Language == "sh").SelectMany(block => block.Text.Split('\n'));
        var inText = Quoted().Matches(Block().Replace(markdown, "")).Select(match => match.Groups[1].Value.ReplaceLineEndings(" "));
        return new ReadmeFile([.. yaml, .. csv], [.. lines.Concat(inText).Where(line => line.StartsWith(Program, StringComparison.Ordinal)).Distinct()]);
    }

    /// <summary>The words after the program's name; null when the command holds a placeholder such as ID.</summary>
    public static string[]? Arguments(string command)
    {
        var words = command[Program.Length..].Split('#')[0].Split(' ', StringSplitOptions.RemoveEmptyEntries);
        return words.Any(word => word.Length > 1 && word.All(c => char.IsAsciiLetterUpper(c) || c == '.' || c == '_')) ? null : words;
    }

    [GeneratedRegex(@"^```(\w*)\n(.*?)^```\s*$", RegexOptions.Multiline | RegexOptions.Singleline | RegexOptions.CultureInvariant)]
    private static partial Regex Block();

    [GeneratedRegex(@"`([\w-]+\.csv)`", RegexOptions.CultureInvariant)]
    private static partial Regex CsvName();

    [GeneratedRegex(@"`(\./run-audit\.sh[^`]*)`", RegexOptions.CultureInvariant)]
    private static partial Regex Quoted();
}
