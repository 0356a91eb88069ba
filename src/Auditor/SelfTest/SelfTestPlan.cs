using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>What the self-test compares (self-test.json): declarations of reference cases, and files of values of distributions.</summary>
internal sealed record SelfTestPlan(IReadOnlyList<PlannedAudit> Audits, IReadOnlyList<string> Distributions)
{
    public static SelfTestPlan Read(Func<string, string> read) => JsonSerializer.Deserialize(read("self-test.json"), SelfTestShapes.Default.SelfTestPlan)!;
}

/// <param name="Variant">The ending of the declaration: empty, -largest, -powers, -largest-powers.</param>
internal sealed record PlannedAudit(string Case, string Variant)
{
    public string Id => Case + Variant;

    public string Declaration => $"{Case}/declaration{Variant}.yaml";
}
