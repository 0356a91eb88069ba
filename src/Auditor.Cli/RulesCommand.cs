using Auditor.Rules;

namespace Auditor.Cli;

/// <summary>Lists rules and facts, or explains one rule.</summary>
internal static class RulesCommand
{
    /// <param name="id">The rule to explain; null lists all.</param>
    public static int Run(string? id, string? folder, string? policyFile)
    {
        var files = RuleFiles.Read(folder, policyFile);
        var lines = files.Value is { } read ? Lines(id, read) : Reading<IReadOnlyList<string>>.Failed(files.Problems);
        if (lines.Value is null)
        {
            return Complaint.Unusable(lines.Problems);
        }

        foreach (var line in lines.Value)
        {
            Console.Out.WriteLine(line);
        }

        return ExitStatus.Audited;
    }

    private static Reading<IReadOnlyList<string>> Lines(string? id, RuleFiles files) => id is null
        ? Reading<IReadOnlyList<string>>.Of(RuleListing.All(files.Rules))
        : RuleListing.Explain(id, files.Rules, files.Policy);
}
