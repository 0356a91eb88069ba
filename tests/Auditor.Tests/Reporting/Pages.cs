using Auditor.Reporting;

namespace Auditor.Tests.Reporting;

/// <summary>Pages from the shipped templates.</summary>
internal static class Pages
{
    public static string Render(AuditRecord record) => new HtmlReport(Template).Render(record);

    public static string Template(string name) => Repository.Text("templates", "report", name);
}
