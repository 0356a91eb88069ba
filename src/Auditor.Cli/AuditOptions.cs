using System.CommandLine;
using Auditor.Findings;

namespace Auditor.Cli;

/// <summary>What one audit is asked to do.</summary>
/// <param name="FailOn">Findings of this severity or graver make the exit status 1; null: never.</param>
/// <param name="Moment">When the run started, as the record says.</param>
/// <param name="MemoryBytes">Most memory that what has one value a row may take; null: half of what is free.</param>
internal sealed record AuditRequest(
    string Declaration,
    string OutputFolder,
    string? PolicyFile,
    string? RulesFolder,
    AcceptanceOptions Acceptances,
    string? DataRoot,
    IReadOnlyList<string> Formats,
    Severity? FailOn,
    int Threads,
    long? MemoryBytes,
    long Seed,
    DateTimeOffset Moment,
    bool Quiet,
    bool Verbose,
    bool NoProgress);

/// <param name="File">The acceptances file; null: none.</param>
/// <param name="AsOf">The day on which acceptances must hold, when one was asked for.</param>
internal sealed record AcceptanceOptions(string? File, DateOnly? AsOf);

/// <summary>The options of an audit, the same after a declaration and after <c>demo</c>.</summary>
internal sealed class AuditOptions
{
    private readonly RuleOptions _rules = new();
    private readonly Option<string?> _out = Options.Text("--out", "DIR", "Folder for the report and the record (default: audit-out beside the declaration; demo: ./audit-out).");
    private readonly Option<string?> _acceptances = Options.Text("--acceptances", "FILE", "Findings that a named approver has accepted.");
    private readonly Option<string?> _asOf = Options.Text("--as-of", "DATE", "The day that decides whether an acceptance has expired, YYYY-MM-DD (default: today in UTC, or SOURCE_DATE_EPOCH).");
    private readonly Option<string?> _dataRoot = Options.Text("--data-root", "DIR", "Folder that the data may lie in, besides the declaration's own.");
    private readonly Option<string?> _formats = Options.Text("--formats", "LIST", "Any of html,json (default: both).");
    private readonly Option<string?> _failOn = Options.Text("--fail-on", "SEVERITY", "high | medium | low | never (default: high).");
    private readonly Option<string?> _threads = Options.Text("--threads", "N", "Threads to use (default: one for each processor).");
    private readonly Option<string?> _memory = Options.Text("--memory", "SIZE", "Memory for the data's columns, such as 512M or 4G; larger data go through a file beside the output (default: half of what is free).");
    private readonly Option<string?> _seed = Options.Text("--seed", "N", "Seed of everything drawn at random, kept in the record (default 1).");
    private readonly Option<bool> _quiet = new("--quiet") { Description = "Nothing on standard output." };
    private readonly Option<bool> _verbose = new("--verbose") { Description = "Steps and their seconds on standard error." };
    private readonly Option<bool> _noProgress = new("--no-progress") { Description = "No line on the terminal that says how far the run is." };

    public void AddTo(Command command)
    {
        Option[] all = [_out, .. _rules.All, _acceptances, _asOf, _dataRoot, _formats, _failOn, _threads, _memory, _seed, _quiet, _verbose, _noProgress];
        foreach (var option in all)
        {
            command.Options.Add(option);
        }
    }

    /// <summary>The request, or null with what is wrong added to the problems.</summary>
    public AuditRequest? Read(ParseResult parsed, string declaration, string defaultOut, ICollection<string> problems)
    {
        var before = problems.Count;
        var request = new AuditRequest(
            declaration,
            parsed.GetValue(_out) ?? defaultOut,
            _rules.PolicyFile(parsed),
            _rules.Folder(parsed),
            new AcceptanceOptions(parsed.GetValue(_acceptances), OptionValues.Date("--as-of", parsed.GetValue(_asOf), problems)),
            parsed.GetValue(_dataRoot),
            OptionValues.Formats(parsed.GetValue(_formats), problems),
            OptionValues.FailOn(parsed.GetValue(_failOn), problems),
            (int)OptionValues.Whole("--threads", parsed.GetValue(_threads), Environment.ProcessorCount, 1, 1024, problems),
            OptionValues.Size("--memory", parsed.GetValue(_memory), problems),
            OptionValues.Whole("--seed", parsed.GetValue(_seed), 1, 0, long.MaxValue, problems),
            Clock.Now(problems),
            parsed.GetValue(_quiet),
            parsed.GetValue(_verbose),
            parsed.GetValue(_noProgress));
        return problems.Count == before ? request : null;
    }
}
