using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Reporting;

/// <summary>Writes the evidence of a self-test, for machines and for people.</summary>
public static class SelfTestReport
{
    private const string Page = "self-test.html";

    public static byte[] Json(SelfTestRecord record) => JsonText.Write(record);

    /// <param name="readTemplate">Gives the text of a template by file name.</param>
    public static string Html(SelfTestRecord record, Func<string, string> readTemplate) => new TemplateSet(readTemplate).Render(Page, new SelfTestPage(record));
}
