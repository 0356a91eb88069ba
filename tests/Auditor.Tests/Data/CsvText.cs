using System.IO.Compression;
using System.Text;
using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Tests.Data;

/// <summary>Reads tables from text that stands in the test.</summary>
internal static class CsvText
{
    public const string Name = "leases.csv";

    public static readonly DelimitedFormat Comma = new(',', Gzip: false);

    public static CsvSource Source(string text, DelimitedFormat? format = null) => Source(Encoding.UTF8.GetBytes(text), format);

    public static CsvSource Source(byte[] bytes, DelimitedFormat? format = null) =>
        new(Name, () => new MemoryStream(bytes, writable: false), format ?? Comma);

    /// <summary>Reads all columns of a text, kinds inferred.</summary>
    public static Reading<DataTable> ReadAll(string text, params IReadOnlyList<string> missing) => ReadAll(Source(text), missing);

    public static Reading<DataTable> ReadAll(CsvSource source, params IReadOnlyList<string> missing)
    {
        var names = source.ReadColumnNames();
        return names.Value is null
            ? Reading<DataTable>.Failed(names.Problems)
            : source.Read([.. names.Value.Select(name => new ColumnRequest(name, null))], missing.Count > 0 ? missing : DataDeclaration.DefaultMissing);
    }

    public static Reading<DataTable> Read(string text, params IReadOnlyList<ColumnRequest> requests) =>
        Source(text).Read(requests, DataDeclaration.DefaultMissing);

    public static DataTable Table(string text)
    {
        var reading = ReadAll(text);
        Assert.Empty(reading.Problems);
        return reading.Value!;
    }

    public static double[] Numbers(this DataTable table, string column) => Assert.IsType<NumberColumn>(table[column]).Values.ToArray();

    public static string?[] Texts(this DataTable table, string column) =>
        [.. Enumerable.Range(0, table.RowCount).Select(table[column].Text)];

    public static byte[] Gzip(byte[] bytes)
    {
        var packed = new MemoryStream();
        using (var gzip = new GZipStream(packed, CompressionLevel.Fastest))
        {
            gzip.Write(bytes);
        }

        return packed.ToArray();
    }

    /// <summary>The problems as printed.</summary>
    public static string[] Words<T>(Reading<T> reading)
        where T : class
    {
        Assert.Null(reading.Value);
        return [.. reading.Problems.Select(problem => problem.ToString())];
    }
}
