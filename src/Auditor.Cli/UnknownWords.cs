using System.CommandLine;
using Auditor.Yaml;

namespace Auditor.Cli;

/// <summary>What does not belong on the command line, in words that name the nearest option.</summary>
internal static class UnknownWords
{
    /// <param name="declaration">What the parser took for the declaration, which may be an option it does not know.</param>
    public static IReadOnlyList<string> In(ParseResult parsed, string? declaration)
    {
        var command = parsed.CommandResult.Command;
        var options = command.Options.Select(option => option.Name).ToList();
        string[] unknown = declaration?.StartsWith('-') == true ? [declaration] : [];
        string[] unmatched = command.TreatUnmatchedTokensAsErrors ? [.. parsed.UnmatchedTokens] : [];

        // Beside an unknown option, a word too many is its value, or the declaration when the option was taken for that.
        string[] words = [.. unknown, .. unmatched];
        var told = words.Any(word => word.StartsWith('-')) ? words.Where(word => word.StartsWith('-')) : words;
        return [.. told.Select(word => Message(word, command, options)), .. Others(parsed, unmatched)];
    }

    private static string Message(string word, Command command, List<string> options) =>
        word.StartsWith('-') ? $"'{word}' is not an option here" + NearestName.DidYouMean(word, options)
        : command is RootCommand ? $"'{word}' is one word too many: one declaration at a time"
        : $"'{word}' is one word too many after '{command.Name}'";

    /// <summary>The parser's other complaints, such as an option without its value.</summary>
    private static IEnumerable<string> Others(ParseResult parsed, string[] unmatched) =>
        parsed.Errors.Select(error => error.Message).Where(message => !unmatched.Any(word => message.Contains($"'{word}'", StringComparison.Ordinal)));
}
