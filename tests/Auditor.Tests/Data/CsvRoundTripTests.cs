using System.Globalization;
using Auditor.Data;
using CsCheck;

namespace Auditor.Tests.Data;

public sealed class CsvRoundTripTests
{
    private static readonly Gen<string> Cell = Gen.OneOf(
        Gen.String[Gen.Char["\"\",,\n\r\t ;abÄß€漢"], 0, 12],
        Gen.String[Gen.Char['\u0020', '\uD7FF'], 0, 6]);

    private static readonly Gen<(string[][] Rows, string End)> Tables =
        from width in Gen.Int[1, 5]
        from rows in Cell.Array[width].Array[1, 30]
        from end in Gen.Bool.Select(windows => windows ? "\r\n" : "\n")
        select (rows, end);

    /// <summary>Any table written as RFC 4180 (section 2) says comes back equal, cell for cell.</summary>
    [Fact]
    public void What_is_written_by_the_standard_is_read_back() => Tables.Sample(table =>
    {
        var (rows, end) = table;
        string[] names = [.. Enumerable.Range(1, rows[0].Length).Select(i => string.Create(CultureInfo.InvariantCulture, $"c{i}"))];
        var text = string.Concat(rows.Prepend(names).Select(row => string.Join(',', row.Select(Written)) + end));
        var read = CsvText.Source(text).Read([.. names.Select(name => new ColumnRequest(name, ColumnKind.Text))], ["no such text"]).Value!;

        Assert.Equal(rows.Length, read.RowCount);
        for (var column = 0; column < names.Length; column++)
        {
            Assert.Equal(rows.Select(row => row[column]), read.Texts(names[column]));
        }
    });

    [Fact]
    public void Numbers_come_back_to_the_last_bit() => Gen.Double.Where(double.IsFinite).Array[1, 50].Sample(values =>
    {
        var text = "x\n" + string.Join('\n', values.Select(value => value.ToString("R", CultureInfo.InvariantCulture)));

        Assert.Equal(values, CsvText.Table(text).Numbers("x"));
    });

    private static string Written(string cell) =>
        cell.Length == 0 || cell.AsSpan().ContainsAny(",\"\r\n") ? "\"" + cell.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"" : cell;
}
