using System.Text;
using Auditor.Reporting;

namespace Auditor.Cli;

/// <summary>Writes all outputs under temporary names and renames them together: a run that does not finish leaves no half of any.</summary>
internal static class OutputFiles
{
    /// <summary>The paths written, or why the folder cannot be used.</summary>
    public static Reading<IReadOnlyList<string>> Write(AuditRequest request, AuditRecord record)
    {
        var outputs = request.Formats
            .Select(format => (Path: Path.Combine(request.OutputFolder, record.Model.Id + "." + format), Bytes: Render(format, record)))
            .ToList();
        var temporary = outputs.Select(output => output.Path + ".tmp-" + Guid.NewGuid().ToString("N")).ToList();
        try
        {
            Directory.CreateDirectory(request.OutputFolder);
            foreach (var (output, path) in outputs.Zip(temporary))
            {
                File.WriteAllBytes(path, output.Bytes);
            }

            foreach (var (output, path) in outputs.Zip(temporary))
            {
                File.Move(path, output.Path, overwrite: true);
            }

            return Reading<IReadOnlyList<string>>.Of([.. outputs.Select(output => output.Path)]);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            temporary.ForEach(File.Delete);
            return Reading<IReadOnlyList<string>>.Failed(new Problem(request.OutputFolder, null, "the outputs cannot be written here: " + fault.Message));
        }
    }

    private static byte[] Render(string format, AuditRecord record) => format switch
    {
        "html" => Encoding.UTF8.GetBytes(new HtmlReport(BundledFiles.ReadTemplate).Render(record)),
        _ => JsonRecord.Write(record),
    };
}
