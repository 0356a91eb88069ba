using System.Text;
using Auditor.Reporting;

namespace Auditor.Tests.Architecture;

/// <summary>Nothing that an audit says or writes depends on the culture of the machine.</summary>
public sealed class CultureTests(ITestOutputHelper output)
{
    [Fact]
    public void Record_page_and_summary_are_the_same_in_every_culture()
    {
        var texts = new[] { "", "de-DE", "tr-TR", "ar-SA" }.Select(culture => Cultures.In(culture, Outputs)).ToList();
        output.WriteLine($"{texts.Count} cultures, {texts[0].Length} characters each");
        Assert.True(texts.Count >= 3);
        Assert.True(texts[0].Length > 50_000);
        Assert.Single(texts.Distinct(StringComparer.Ordinal));
    }

    private static string Outputs()
    {
        var record = AuditRunner.Record(Path.Combine(TestFolders.Demo, "declaration.yaml"), "");
        var page = new HtmlReport(name => File.ReadAllText(Path.Combine(TestFolders.Root, "templates", "report", name))).Render(record);
        return Encoding.UTF8.GetString(JsonRecord.Write(record)) + page + ConsoleSummary.Of(record);
    }
}
