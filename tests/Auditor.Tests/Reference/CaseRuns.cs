using System.Collections.Concurrent;
using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Audits of the reference cases' declarations. Records are made once and kept.</summary>
internal static class CaseRuns
{
    private static readonly ConcurrentDictionary<string, Lazy<CaseRun>> Kept = new();

    /// <param name="policyLine">One more line of policy, or nothing.</param>
    public static CaseRun Of(string name, string variant = "", string policyLine = "") =>
        Kept.GetOrAdd(string.Join('|', name, variant, policyLine), _ => new Lazy<CaseRun>(() => Make(name, variant, policyLine))).Value;

    private static CaseRun Make(string name, string variant, string policyLine)
    {
        string policy = ReferenceFiles.ReadText("policy-reference.yaml") + policyLine + "\n";
        JsonDocument record = AuditRunner.Run(ReferenceFiles.FullPath($"{name}/declaration{variant}.yaml"), policy);
        return new CaseRun(ReferenceCases.Named(name), variant, new RecordView(record.RootElement));
    }
}
