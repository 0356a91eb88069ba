using Auditor.Reporting;
using Auditor.Tests;
using Auditor.Tests.Reporting;

namespace Auditor.Browser.Tests;

/// <summary>The pages that the tests open, each made once.</summary>
internal static class ReportPages
{
    public const string Demo = "demo";
    public const string Hostile = "hostile";
    public const string Nulls = "nulls";

    private static readonly Lazy<AuditRecord> Audited = new(() => Audit(""));

    private static readonly Dictionary<string, Lazy<string>> Made = new()
    {
        [Demo] = new(() => Pages.Render(DemoRecord)),
        [Hostile] = new(() => Pages.Render(HostileRecords.Of(HostileRecords.Text))),
        [Nulls] = new(() => Pages.Render(SampleRecords.MostlyNull)),
    };

    public static AuditRecord DemoRecord => Audited.Value;

    public static string Named(string name) => Made[name].Value;

    /// <summary>The demo, audited under a policy that overrides single values.</summary>
    public static AuditRecord Audit(string policy) => AuditRunner.Record(Path.Combine(TestFolders.Demo, "declaration.yaml"), policy);
}
