using System.Text;
using Auditor.Reporting;

namespace Auditor.Cli;

/// <summary>The report and the record of an audit, put in place together.</summary>
internal static class OutputFiles
{
    /// <summary>The paths written, or why the folder cannot be used.</summary>
    public static Reading<IReadOnlyList<string>> Write(AuditRequest request, AuditRecord record)
    {
        var outputs = request.Formats
            .Select(format => (Path: Path.Combine(request.OutputFolder, record.Model.Id + "." + format), Bytes: Render(format, record)))
            .ToList();
        return FilesTogether.Put(request.OutputFolder, outputs) is { } fault
            ? Reading<IReadOnlyList<string>>.Failed(new Problem(request.OutputFolder, null, "the outputs cannot be written here: " + fault))
            : Reading<IReadOnlyList<string>>.Of([.. outputs.Select(output => output.Path)]);
    }

    private static byte[] Render(string format, AuditRecord record) => format switch
    {
        "html" => Encoding.UTF8.GetBytes(new HtmlReport(BundledFiles.ReadTemplate).Render(record)),
        _ => JsonRecord.Write(record),
    };
}
