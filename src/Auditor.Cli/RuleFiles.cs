using System.Text;
using Auditor.Policies;
using Auditor.Rules;

namespace Auditor.Cli;

/// <summary>The policy and rules in force.</summary>
/// <param name="Sha256">Hash over the policy files and rule files in force, in order.</param>
internal sealed record RuleFiles(Policy Policy, IReadOnlyList<Rule> Rules, string Sha256)
{
    private const string PolicyName = "policy.yaml";

    /// <param name="folder">Replaces the shipped rules; its own policy.yaml, if any, replaces the shipped one.</param>
    /// <param name="firmPolicy">Overrides single values.</param>
    public static Reading<RuleFiles> Read(string? folder, string? firmPolicy)
    {
        var rules = folder ?? BundledFiles.Rules;
        if (!Directory.Exists(rules))
        {
            return Reading<RuleFiles>.Failed(new Problem(rules, null, "the rule folder does not exist"));
        }

        var own = Path.Combine(rules, PolicyName);
        var policyFile = File.Exists(own) ? own : BundledFiles.Policy;
        var names = Directory.GetFiles(rules, "*.yaml").Where(file => Path.GetFileName(file) != PolicyName).Order(StringComparer.Ordinal);
        string[] paths = [policyFile, .. firmPolicy is null ? Array.Empty<string>() : [firmPolicy], .. names];
        var texts = paths.Select(path => (Path: Named(path), Reading: FileText.Read(path))).ToList();
        var unread = texts.SelectMany(text => text.Reading.Problems).ToList();
        return unread.Count > 0 ? Reading<RuleFiles>.Failed(unread) : Read(rules, texts.ConvertAll(text => (text.Path, text.Reading.Value!)), firmPolicy is not null);
    }

    /// <summary>A shipped file is named as in the documentation, not by where this copy of the program lies.</summary>
    private static string Named(string path) =>
        Path.GetDirectoryName(path) == BundledFiles.Rules ? "rules/" + Path.GetFileName(path) : path;

    private static Reading<RuleFiles> Read(string folder, List<(string Path, FileText Text)> files, bool withFirm)
    {
        var policy = PolicyReader.Read(
            files[0].Text.Text, files[0].Path, withFirm ? files[1].Text.Text : null, withFirm ? files[1].Path : null);
        if (policy.Value is null)
        {
            return Reading<RuleFiles>.Failed(policy.Problems);
        }

        var rules = RuleReader.Read([.. files.Skip(withFirm ? 2 : 1).Select(file => (file.Path, file.Text.Text))], policy.Value);
        var hashes = string.Join('\n', files.Select(file => file.Text.Sha256));
        return rules.Value is null ? Reading<RuleFiles>.Failed(rules.Problems)
            : rules.Value.Count == 0 ? Reading<RuleFiles>.Failed(new Problem(folder, null, "found no rule in this folder, expected at least one in its .yaml files"))
            : Reading<RuleFiles>.Of(new RuleFiles(policy.Value, rules.Value, FileText.Hash(Encoding.UTF8.GetBytes(hashes))));
    }
}
