using Auditor.Reporting.Html;

namespace Auditor.Reporting;

/// <summary>Writes the record as one self-contained page: whole without script, no network, no font but the reader's own. The page allows its own script alone, by its hash.</summary>
/// <param name="readTemplate">Gives the text of a template of the report, by file name.</param>
public sealed class HtmlReport(Func<string, string> readTemplate)
{
    private const string Page = "page.html";
    private const string Script = "report.js";

    /// <exception cref="InvalidOperationException">A template does not parse.</exception>
    public string Render(AuditRecord record) => new TemplateSet(readTemplate).Render(Page, new ReportPage(record, new PageScript(readTemplate(Script))));
}
