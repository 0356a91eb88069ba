using System.Text;
using Auditor.Data;
using Auditor.Starting;

namespace Auditor.Cli;

/// <summary>Writes a commented first declaration for a data file; never over a file that is there.</summary>
internal static class NewCommand
{
    /// <param name="file">Where to write it; null: here, named after the data.</param>
    public static int Run(string data, string response, string? file)
    {
        var id = StartRequest.IdOf(Path.GetFileName(data));
        var target = file ?? id + ".yaml";
        if (DataFile.Unreadable(Path.GetFullPath(data), data) is { } fault)
        {
            return Complaint.Unusable([new Problem(data, null, fault)]);
        }

        if (Path.Exists(target))
        {
            return Complaint.Unusable([new Problem(target, null, "it is there already and is not written over; name another file with --out FILE")]);
        }

        var written = Write(data, target, id, response);
        return written.Value is null ? Complaint.Unusable(written.Problems) : Said(data, target);
    }

    private static Reading<string> Write(string data, string target, string id, string response)
    {
        try
        {
            var (hash, rows) = DataFile.Hash(data);
            var source = DataFile.Csv(data, data, new CsvReading(rows, Environment.ProcessorCount));
            var text = FirstDeclaration.Of(source, new StartRequest(id, RelativeSource(data, target), hash, response));
            if (text.Value is { } declaration)
            {
                using var stream = new FileStream(target, FileMode.CreateNew);
                stream.Write(Encoding.UTF8.GetBytes(declaration));
            }

            return text;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Reading<string>.Failed(new Problem(target, null, "it cannot be written from these data: " + fault.Message));
        }
    }

    private static int Said(string data, string target)
    {
        var outside = RealPath.Within(data, FolderOf(target)) ? "" : " --data-root " + Shell.Word(FolderOf(data));
        Console.Out.WriteLine("Written: " + target);
        Console.Out.WriteLine($"Audit it with: {Shell.Program} {Shell.Word(target)}{outside}");
        return ExitStatus.Audited;
    }

    private static string RelativeSource(string data, string target) =>
        Path.GetRelativePath(FolderOf(target), Path.GetFullPath(data)).Replace(Path.DirectorySeparatorChar, '/');

    private static string FolderOf(string file) => Path.GetDirectoryName(Path.GetFullPath(file))!;
}
