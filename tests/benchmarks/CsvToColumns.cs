using System.Security.Cryptography;
using Auditor.Data;
using DuckDB.NET.Data;

namespace Auditor.Benchmarks;

/// <summary>The same file read by the tool into columns, and summed by an embedded column store's own scan.</summary>
internal static class CsvToColumns
{
    /// <summary>The sum of all cells, so that nothing can be left out.</summary>
    public static double Tool(string path, int threads)
    {
        var table = Table(path, threads);
        return table.Columns.OfType<NumberColumn>().Sum(column => column.Values.Where(double.IsFinite).Sum());
    }

    /// <summary>As the command line reads: lines are counted first, there in the same look at the bytes as the hash, so that every array has its length from the start.</summary>
    public static DataTable Table(string path, int threads)
    {
        var reading = new CsvReading(Lines(path), threads);
        var source = new CsvSource(
            Path.GetFileName(path), () => new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.Read, 0), DelimitedFormat.FromFileName(path)!, reading);
        var names = source.ReadColumnNames().Value!;
        return source.Read([.. names.Select(name => new ColumnRequest(name, null))], [""]).Value!;
    }

    /// <summary>The hash that stands in every record.</summary>
    public static byte[] Hash(string path)
    {
        using var stream = File.OpenRead(path);
        return SHA256.HashData(stream);
    }

    public static double DuckDb(string path, int threads)
    {
        using var connection = new DuckDBConnection("DataSource=:memory:");
        connection.Open();
        using var command = connection.CreateCommand();
        command.CommandText = $"SET threads = {threads}";
        command.ExecuteNonQuery();
        var columns = string.Join(", ", Names(path).Select(name => $"sum({name})"));
        command.CommandText = $"SELECT {columns} FROM read_csv('{path.Replace("'", "''", StringComparison.Ordinal)}', header = true)";
        using var reader = command.ExecuteReader();
        reader.Read();
        return Enumerable.Range(0, reader.FieldCount).Sum(reader.GetDouble);
    }

    private static int Lines(string path)
    {
        using var stream = new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.Read, 0);
        var (lines, block) = (new LineCount(), new byte[1 << 16]);
        for (var got = stream.Read(block); got > 0; got = stream.Read(block))
        {
            lines.Add(block.AsSpan(0, got));
        }

        return path.EndsWith(".gz", StringComparison.Ordinal) ? 0 : lines.Rows;
    }

    private static string[] Names(string path)
    {
        using var text = new StreamReader(path);
        return text.ReadLine()!.Split(',');
    }
}
