using System.Text;
using Auditor.Reporting;
using Auditor.Tests.Reporting;

namespace Auditor.Tests.Demo;

/// <summary>The demo's whole record and page, kept. Full doubles are rounded to seven digits, so that the last bits of a logarithm do not matter.</summary>
public sealed class DemoGoldenTests
{
    private static readonly AuditRecord Demo = AuditRunner.Record(Path.Combine(TestFolders.Demo, "declaration.yaml"), "");

    [Fact]
    public void The_record_is_the_golden_one() => Golden.Matches(RoundedText.Of(Encoding.UTF8.GetString(JsonRecord.Write(Demo))), "demo.json");

    [Fact]
    public void The_page_is_the_golden_one() => Golden.Matches(RoundedText.Of(Pages.Render(Demo)), "demo.html");
}
