using Auditor.Acceptances;
using Auditor.Findings;

namespace Auditor.Cli;

/// <summary>The acceptances file of a run: named on the command line only, never by the author's declaration.</summary>
/// <param name="Entries">Empty when no file was given.</param>
/// <param name="Sha256">Null when no file was given.</param>
internal sealed record AcceptanceFile(IReadOnlyList<AcceptanceEntry> Entries, string? Name, string? Sha256)
{
    /// <param name="path">Null when none was given.</param>
    /// <param name="rules">The rules in force; null when they could not be read, and then no entry can be checked.</param>
    public static Reading<AcceptanceFile> Read(string? path, RuleFiles? rules)
    {
        if (path is null)
        {
            return Reading<AcceptanceFile>.Of(new AcceptanceFile([], null, null));
        }

        var file = FileText.Read(path);
        if (file.Value is not { } text || rules is null)
        {
            return Reading<AcceptanceFile>.Failed(file.Problems);
        }

        var entries = AcceptanceReader.Read(text.Text, path, rules.Rules);
        return entries.Value is { } read
            ? Reading<AcceptanceFile>.Of(new AcceptanceFile(read, Path.GetFileName(path), text.Sha256))
            : Reading<AcceptanceFile>.Failed(entries.Problems);
    }
}
