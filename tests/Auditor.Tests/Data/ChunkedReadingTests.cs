using System.Globalization;
using System.Text;
using Auditor.Data;
using Auditor.Declaration;
using CsCheck;

namespace Auditor.Tests.Data;

/// <summary>
/// A file read in small chunks by several threads gives what it gives read in one piece by one: the same cells, level codes, kinds and problems. In one piece no row end is
/// looked for by our own code, so the reader of fields is the measure.
/// </summary>
public sealed class ChunkedReadingTests
{
    private static readonly DelimitedFormat Packed = new(',', Gzip: true);

    private static readonly Gen<string> Number = Gen.OneOf(
        Gen.Int[-99, 999].Select(i => i.ToString(CultureInfo.InvariantCulture)),
        Gen.Double[-9, 9].Select(x => x.ToString("R", CultureInfo.InvariantCulture)));

    private static readonly Gen<string> Field = Gen.Frequency(
        (6, Number),
        (3, OneOf("north", "south", "ä€", "2020-01-31", "26a", " ", "\uFEFF")),
        (2, OneOf("", "NA")),
        (2, OneOf("\"\"", "\"a \"\"b\"\"\"", "\"1\"", "\"x,y\"", "\"two\nlines\"", "\"two\r\nlines\"", "\"\r\"", "\"\n\n\"")));

    private static readonly Gen<string> End = OneOf("\n", "\r\n", "\r");

    /// <summary>Rows as they should be, with a missing or spare field, a blank line or a long one now and then.</summary>
    private static readonly Gen<string> WellDivided =
        from width in Gen.Int[1, 4]
        from end in End
        from rows in Row(width).Array[0, 40]
        from last in Gen.Bool
        from mark in Gen.Bool
        let text = string.Join(end, rows.Prepend(string.Join(',', Enumerable.Range(1, width).Select(i => $"c{i}"))))
        select (mark ? "\uFEFF" : "") + text + (last ? end : "");

    private static readonly Gen<string> AnyText = OneOf("\"", "\"", ",", ",", "\n", "\n", "\r", "\r\n", "1", "22", "x", "é", "\uFEFF")
        .Array[0, 80].Select(pieces => "a,b\n" + string.Concat(pieces));

    private static readonly Gen<(int Bytes, int Threads, int Rows)> Ways =
        from bytes in Gen.Int[16, 200]
        from threads in Gen.Int[1, 3]
        from rows in Gen.Int[0, 60]
        select (bytes, threads, rows);

    private static Gen<string> OneOf(params string[] texts) => Gen.Int[0, texts.Length - 1].Select(i => texts[i]);

    private static Gen<string> Row(int width) => Gen.Frequency(
        (30, Field.Array[width].Select(fields => string.Join(',', fields))),
        (1, Field.Array[width + 1].Select(fields => string.Join(',', fields))),
        (1, Gen.Const("")),
        (1, Gen.Int[300, 3000].Select(length => new string('w', length) + new string(',', width - 1))));

    [Fact]
    public void Rows_of_every_shape_read_the_same() =>
        Gen.Select(WellDivided, Ways, Gen.Bool).Sample(
            (text, way, gzip) => Assert.Equal(Whole(text), Words(text, gzip, new CsvReading(way.Rows, way.Threads, way.Bytes))), iter: 3000);

    [Fact]
    public void Quotation_marks_and_line_ends_at_random_read_the_same() =>
        Gen.Select(AnyText, Ways, Gen.Bool).Sample(
            (text, way, gzip) => Assert.Equal(Whole(text), Words(text, gzip, new CsvReading(way.Rows, way.Threads, way.Bytes))), iter: 5000);

    /// <summary>Each text first appears in another chunk, in an order of its own.</summary>
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(4)]
    public void Levels_are_numbered_by_first_appearance_whatever_thread_met_them_first(int threads)
    {
        string[] cells = [.. Enumerable.Range(0, 20_000).Select(i => i * 7919 % 20_011 % 997).Select(i => $"l{i}")];
        var text = "id,level\n" + string.Concat(cells.Select((cell, i) => string.Create(CultureInfo.InvariantCulture, $"{i},{cell}\n")));
        var column = Assert.IsType<LevelsColumn>(Table(text, new CsvReading(Threads: threads, ChunkBytes: 4096))["level"]);

        string[] expected = [.. cells.Distinct()];
        Assert.Equal(expected, column.Texts);
        Assert.Equal(cells.Select(cell => Array.IndexOf(expected, cell)), column.Codes);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(7)]
    [InlineData(5000)]
    [InlineData(80_000)]
    public void A_wrong_number_of_expected_rows_changes_nothing(int rows)
    {
        var text = "x\n" + string.Concat(Enumerable.Range(0, 5000).Select(i => string.Create(CultureInfo.InvariantCulture, $"{i}\n")));

        Assert.Equal(Enumerable.Range(0, 5000).Select(i => (double)i), Table(text, new CsvReading(rows, 2, 512)).Numbers("x"));
    }

    /// <summary>A mark at the start of a row far into the file belongs to its first cell, and there is no second start of the file.</summary>
    [Fact]
    public void A_byte_order_mark_within_the_file_is_text() =>
        Assert.Equal(["one", "\uFEFFtwo", "three"], Table("x\none\n\uFEFFtwo\nthree\n", new CsvReading(ChunkBytes: 16)).Texts("x"));

    [Fact]
    public void Progress_reaches_all_rows_and_bytes()
    {
        var reports = new Reports();
        var text = "x\n" + string.Concat(Enumerable.Repeat("12345\n", 1000));
        Table(text, new CsvReading(Threads: 2, ChunkBytes: 256, Progress: reports));

        Assert.True(reports.All.Count > 10);
        Assert.Equal(new ReadingProgress(1000, text.Length, text.Length), reports.All[^1]);
        Assert.Equal(reports.All.Select(report => report.Rows).Order(), reports.All.Select(report => report.Rows));
    }

    [Theory]
    [InlineData("a\n1\n2\n", 2)]
    [InlineData("a\r\n1\r\n2", 2)]
    [InlineData("a", 0)]
    [InlineData("", 0)]
    public void Lines_are_counted_from_blocks(string text, int rows)
    {
        var lines = new LineCount();
        foreach (var block in Encoding.UTF8.GetBytes(text).Chunk(3))
        {
            lines.Add(block);
        }

        Assert.Equal(rows, lines.Rows);
    }

    private static string Whole(string text) => Words(text, false, new CsvReading(ChunkBytes: 1 << 20));

    private static DataTable Table(string text, CsvReading reading)
    {
        var read = CsvText.ReadAll(Source(text, false, reading));
        Assert.Empty(read.Problems);
        return read.Value!;
    }

    private static CsvSource Source(string text, bool gzip, CsvReading reading)
    {
        var bytes = Encoding.UTF8.GetBytes(text);
        var stored = gzip ? CsvText.Gzip(bytes) : bytes;
        return new CsvSource(CsvText.Name, () => new MemoryStream(stored, writable: false), gzip ? Packed : CsvText.Comma, reading);
    }

    /// <summary>All that a reading gives: kinds, values to the last bit, codes and their texts; or the problems.</summary>
    private static string Words(string text, bool gzip, CsvReading reading)
    {
        var read = CsvText.ReadAll(Source(text, gzip, reading), DataDeclaration.DefaultMissing);
        return read.Value is { } table
            ? string.Join('\n', table.Columns.Select(column => $"{column.Name} {column.Kind} {table.RowCount}: {Cells(column)}"))
            : string.Join('\n', read.Problems);
    }

    private static string Cells(DataColumn column) => column switch
    {
        NumberColumn numbers => string.Join(' ', numbers.Values.Select(BitConverter.DoubleToInt64Bits)),
        LevelsColumn levels => string.Join(' ', levels.Codes) + " of " + string.Join('|', levels.Texts),
        _ => string.Join('|', Enumerable.Range(0, column.Length).Select(column.Text)),
    };

    private sealed class Reports : IProgress<ReadingProgress>
    {
        public List<ReadingProgress> All { get; } = [];

        public void Report(ReadingProgress value) => All.Add(value);
    }
}
