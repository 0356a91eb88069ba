using System.Text.Json;
using Auditor.Policies;
using Auditor.Reporting;
using Auditor.Rules;
using Auditor.SelfTest;

namespace Auditor.Tests;

/// <summary>The one place where tests turn a declaration into a record, without the command line.</summary>
internal static class AuditRunner
{
    /// <param name="declarationPath">Full path of a declaration; its data stand beside it.</param>
    /// <param name="policyYaml">Text of a policy file that overrides single values; empty for none.</param>
    /// <returns>The audit's record as JSON.</returns>
    public static JsonDocument Run(string declarationPath, string policyYaml) =>
        JsonDocument.Parse(JsonRecord.Write(Record(declarationPath, policyYaml)));

    public static AuditRecord Record(string declarationPath, string policyYaml) =>
        Record(File.ReadAllText(declarationPath), name => File.OpenRead(Path.Combine(Path.GetDirectoryName(declarationPath)!, name)), policyYaml);

    /// <param name="open">Opens the data that the declaration names.</param>
    public static AuditRecord Record(string declaration, Func<string, Stream> open, string policyYaml = "") =>
        Value(Try(declaration, open, policyYaml));

    public static Reading<AuditRecord> Try(string declaration, Func<string, Stream> open, string policyYaml = "")
    {
        var inputs = Inputs(declaration, open, policyYaml);
        return inputs.Value is null ? Reading<AuditRecord>.Failed(inputs.Problems) : Audit.Run(inputs.Value);
    }

    public static Reading<AuditInputs> Inputs(string declaration, Func<string, Stream> open, string policyYaml = "")
    {
        var policy = Value(PolicyReader.Read(Shipped("policy.yaml"), "policy.yaml", policyYaml.Length > 0 ? policyYaml : null, "test-policy.yaml"));
        var read = CaseInputs.Read(declaration, "declaration.yaml", open, policy, Rules(policy), Provenance);
        return read.Value is not { } inputs
            ? read
            : Reading<AuditInputs>.Of(inputs with { Provenance = Provenance with { DataSha256 = Hash(open, inputs.Declaration.Data.Sources[0]) } });
    }

    public static Provenance Provenance { get; } =
        new(NoHash, "data.csv", NoHash, "declaration.yaml", NoHash, "test", 1, "2026-01-01T00:00:00Z");

    private static string NoHash => new('0', 64);

    private static IReadOnlyList<Rule> Rules(Policy policy)
    {
        var files = Directory.GetFiles(Path.Combine(AppContext.BaseDirectory, "rules"), "*.yaml")
            .Where(file => Path.GetFileName(file) != "policy.yaml")
            .Order(StringComparer.Ordinal)
            .Select(file => (Path.GetFileName(file), File.ReadAllText(file)));
        return Value(RuleReader.Read([.. files], policy));
    }

    private static string Hash(Func<string, Stream> open, string name)
    {
        using var stream = open(name);
        return Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(stream));
    }

    private static string Shipped(string name) => File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "rules", name));

    private static T Value<T>(Reading<T> reading)
        where T : class =>
        reading.Value ?? throw new InvalidOperationException(string.Join(Environment.NewLine, reading.Problems));
}
