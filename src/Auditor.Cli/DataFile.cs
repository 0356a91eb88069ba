using System.Security.Cryptography;
using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Cli;

/// <summary>The data file that a declaration names, found, hashed, its columns held against the declaration's.</summary>
internal sealed record DataFile(IDataSource Source, string Sha256)
{
    public static Reading<DataFile> Find(DeclarationReading reading, AuditRequest request, ColumnPlace place, IProgress<ReadingProgress> progress)
    {
        var line = reading.Declaration?.Data.SourceLine;
        if (reading.Sources is not [var source])
        {
            return reading.Sources.Count == 0 ? Reading<DataFile>.Failed() : Failed(request, line, "data.source: a list of files is not built yet");
        }

        var folder = Path.GetDirectoryName(Path.GetFullPath(request.Declaration))!;
        var path = Path.GetFullPath(Path.Combine(folder, source));
        place.Structured = reading.Declaration?.Data.Structure is { } declared && (declared.TimeLine ?? declared.Unit?.Line ?? declared.Cluster?.Line ?? (declared.Segments is [var first, ..] ? first.Line : null)) is not null;
        var fault = Fault(path, source, folder, request);
        return fault is null ? Open(path, source, line, reading, request, place, progress) : Failed(request, line, "data.source: " + fault);
    }

    private static string? Fault(string path, string source, string folder, AuditRequest request)
    {
        if (request.DataRoot is { } declared && !Directory.Exists(declared))
        {
            return $"the folder given with --data-root does not exist: '{declared}'";
        }

        if (RealPath.Of(path) is null)
        {
            return $"'{source}' leads through links that run in a circle";
        }

        if (!RealPath.Within(path, folder) && !(request.DataRoot is { } root && RealPath.Within(path, root)))
        {
            return $"'{source}' lies outside the declaration's folder; allow it with --data-root DIR";
        }

        return Unreadable(path, source);
    }

    /// <summary>Why a path is no data file of a kind that is read; null when it is one.</summary>
    /// <param name="source">The path as the person wrote it.</param>
    public static string? Unreadable(string path, string source)
    {
        if (Directory.Exists(path))
        {
            return $"'{source}' is a folder; a folder of files is not built yet";
        }

        if (!File.Exists(path))
        {
            return $"the file '{source}' does not exist{NearestFile.Hint(path)}";
        }

        return DelimitedFormat.FromFileName(path) is not null ? null
            : path.EndsWith(".parquet", StringComparison.OrdinalIgnoreCase) ? "Parquet is not built yet"
            : $"'{source}' is not a kind of file this program reads: .csv, .tsv, .csv.gz or .tsv.gz";
    }

    private static Reading<DataFile> Open(string path, string source, int? line, DeclarationReading reading, AuditRequest request, ColumnPlace place, IProgress<ReadingProgress> progress)
    {
        try
        {
            var (hash, rows) = Hash(path);
            if (reading.Declaration?.Data.Sha256 is { } declared && !declared.Equals(hash, StringComparison.OrdinalIgnoreCase))
            {
                return Failed(request, line, $"data.source: '{source}' is another file than data.sha256 says: declared {declared}, found {hash}");
            }

            var data = Csv(path, source, new CsvReading(rows, request.Threads, Progress: progress) { Store = place.For });
            var columns = data.ReadColumnNames();
            var problems = columns.Value is { } names ? ColumnCheck.Problems(request.Declaration, reading.Mentions, names) : columns.Problems;
            return problems.Count > 0 ? Reading<DataFile>.Failed(problems) : Reading<DataFile>.Of(new DataFile(data, hash));
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Failed(request, line, $"data.source: '{source}' cannot be read: {fault.Message}");
        }
    }

    public static CsvSource Csv(string path, string name, CsvReading reading) =>
        new(name, () => new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.Read, bufferSize: 0), DelimitedFormat.FromFileName(path)!, reading);

    /// <summary>SHA-256 of the file as stored and, from the same look at its bytes, about how many rows it has; 0 when they are compressed.</summary>
    public static (string Sha256, int Rows) Hash(string path)
    {
        using var stream = new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.Read, bufferSize: 0);
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        var lines = new LineCount();
        var block = new byte[1 << 16];
        for (var got = stream.Read(block); got > 0; got = stream.Read(block))
        {
            hash.AppendData(block, 0, got);
            lines.Add(block.AsSpan(0, got));
        }

        return (Convert.ToHexStringLower(hash.GetHashAndReset()), DelimitedFormat.FromFileName(path) is { Gzip: false } ? lines.Rows : 0);
    }

    private static Reading<DataFile> Failed(AuditRequest request, int? line, string message) =>
        Reading<DataFile>.Failed(new Problem(request.Declaration, line, message));
}
