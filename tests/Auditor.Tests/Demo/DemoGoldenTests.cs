using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using Auditor.Reporting;
using Auditor.Tests.Reporting;

namespace Auditor.Tests.Demo;

/// <summary>The demo's whole record and page, kept. Full doubles are rounded to seven digits, so that the last bits of a logarithm do not matter.</summary>
public sealed partial class DemoGoldenTests
{
    private const double Nothing = 1e-25;

    private static readonly AuditRecord Demo = AuditRunner.Record(Path.Combine(TestFolders.Demo, "declaration.yaml"), "");

    [Fact]
    public void The_record_is_the_golden_one() => Golden.Matches(Rounded(Encoding.UTF8.GetString(JsonRecord.Write(Demo))), "demo.json");

    [Fact]
    public void The_page_is_the_golden_one() => Golden.Matches(Rounded(Pages.Render(Demo)), "demo.html");

    private static string Rounded(string text) => LongNumber().Replace(text, match =>
    {
        var number = double.Parse(match.Value, NumberStyles.Float, CultureInfo.InvariantCulture);
        return Math.Abs(number) < Nothing ? "tiny" : number.ToString("G7", CultureInfo.InvariantCulture);
    });

    [GeneratedRegex(@"-?[0-9]+\.[0-9]{6,}(?:[eE][-+]?[0-9]+)?|-?[0-9]+(?:\.[0-9]+)?[eE][-+]?[0-9]+")]
    private static partial Regex LongNumber();
}
