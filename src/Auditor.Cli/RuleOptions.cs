using System.CommandLine;

namespace Auditor.Cli;

/// <summary>Which policy and rules are in force: the same options wherever rules are read.</summary>
internal sealed class RuleOptions
{
    private readonly Option<string?> _policy = Options.Text("--policy", "FILE", "The firm's overrides of rules/policy.yaml.");
    private readonly Option<string?> _rules = Options.Text("--rules", "DIR", "Replaces the rule folder; without its own policy.yaml the shipped one holds.");

    public IReadOnlyList<Option> All => [_policy, _rules];

    public string? PolicyFile(ParseResult parsed) => parsed.GetValue(_policy);

    public string? Folder(ParseResult parsed) => parsed.GetValue(_rules);
}

/// <summary>How options are made.</summary>
internal static class Options
{
    public static Option<string?> Text(string name, string value, string description) =>
        new(name) { HelpName = value, Description = description };
}
