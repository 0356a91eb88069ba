using System.Globalization;
using System.Text;
using Auditor.Data;

namespace Auditor.Tests.Data;

public sealed class MalformedCsvTests
{
    [Theory]
    [InlineData("", "leases.csv: found no text on the first line, expected the column names")]
    [InlineData("\n1,2\n", "leases.csv: found no text on the first line, expected the column names")]
    [InlineData("a,b\n", "leases.csv: found column names and no data rows, expected at least one row")]
    [InlineData("a,b\n\n\n", "leases.csv: found column names and no data rows, expected at least one row")]
    [InlineData("a,b,a\n1,2,3\n", "leases.csv:1: the header names 'a' more than once, in columns 1 and 3")]
    [InlineData("a,b\n1,2\n3\n", "leases.csv:3: row 2: found 1 field, expected 2 as in the header")]
    [InlineData("a,b\n1,2,3\n", "leases.csv:2: row 1: found 3 fields, expected 2 as in the header")]
    [InlineData("a,b\n1,2\n\n3,4\n", "leases.csv:3: row 2: found 1 field, expected 2 as in the header")]
    [InlineData("a,b\n\"x\ny\",2\n3\n", "leases.csv:4: row 2: found 1 field, expected 2 as in the header")]
    [InlineData("a,b\n5\" pipe,1\n6\" pipe,2\n", "leases.csv:2: row 1: found a quotation mark in the field '5\" pipe,1\\n6\" pipe', expected the whole field between two marks and marks inside doubled")]
    [InlineData("a,b\n\"x\"y,1\n", "leases.csv:2: row 1: found a quotation mark in the field '\"x\"y', expected the whole field between two marks and marks inside doubled")]
    [InlineData("a,b\n1,2\n\"x,1\n3,4\n", "leases.csv:3: row 2: found a quotation mark in the field '\"x,1\\n3,4\\n', expected the whole field between two marks and marks inside doubled")]
    [InlineData("\"a,b\n1,2\n", "leases.csv:1: found a quotation mark in the field '\"a,b\\n1,2\\n', expected the whole field between two marks and marks inside doubled")]
    public void Says_where_what_was_found_and_what_expected(string text, string words) =>
        Assert.Equal([words], CsvText.Words(CsvText.ReadAll(text)));

    [Theory]
    [InlineData(ColumnKind.Number, "abc", "a finite number")]
    [InlineData(ColumnKind.Number, "1e400", "a finite number")]
    [InlineData(ColumnKind.Number, "Infinity", "a finite number")]
    [InlineData(ColumnKind.Number, "nan", "a finite number")]
    [InlineData(ColumnKind.Number, "2020-01-31", "a finite number")]
    [InlineData(ColumnKind.Date, "31.01.2020", "a date as YYYY-MM-DD")]
    public void A_cell_that_does_not_read_as_the_kind_names_row_column_and_ways_out(ColumnKind kind, string cell, string expected)
    {
        var reading = CsvText.Read($"id,price\n1,\n2,{cell}\n", new ColumnRequest("price", kind));

        Assert.Equal(
            [$"leases.csv:3: row 2, column price: found '{cell}', expected {expected}; declare price with kind: levels if its cells are names, or put the text under missing if it means no value"],
            CsvText.Words(reading));
    }

    [Fact]
    public void The_first_ten_bad_cells_are_named_and_the_others_counted()
    {
        var rows = Enumerable.Range(1, 40).Select(i => i <= 12 ? "bad" : i.ToString(CultureInfo.InvariantCulture));
        var words = CsvText.Words(CsvText.ReadAll("x\n" + string.Join('\n', rows)));

        Assert.Equal(11, words.Length);
        Assert.StartsWith("leases.csv:11: row 10, column x: ", words[9], StringComparison.Ordinal);
        Assert.Equal("leases.csv: column x: 2 more cells that are not a finite number", words[10]);
    }

    [Fact]
    public void The_first_ten_ragged_rows_are_named_and_the_others_counted()
    {
        var words = CsvText.Words(CsvText.ReadAll("a,b\n" + string.Concat(Enumerable.Repeat("1\n", 15))));

        Assert.Equal(11, words.Length);
        Assert.Equal("leases.csv: 5 more rows that cannot be divided into fields", words[10]);
    }

    [Fact]
    public void Problems_of_several_kinds_are_listed_together()
    {
        var words = CsvText.Words(CsvText.ReadAll("a,b\n1\n1,2\nx,2\n1,y\n3,4\n"));

        Assert.Equal(3, words.Length);
        Assert.StartsWith("leases.csv:2: row 1: found 1 field", words[0], StringComparison.Ordinal);
        Assert.StartsWith("leases.csv:4: row 3, column a: found 'x'", words[1], StringComparison.Ordinal);
        Assert.StartsWith("leases.csv:5: row 4, column b: found 'y'", words[2], StringComparison.Ordinal);
    }

    [Fact]
    public void Long_text_is_cut_in_messages()
    {
        var words = CsvText.Words(CsvText.Read("x\n" + new string('a', 500) + "\n", new ColumnRequest("x", ColumnKind.Number)));

        Assert.Contains("found '" + new string('a', 40) + "…', expected", Assert.Single(words), StringComparison.Ordinal);
    }

    [Fact]
    public void A_column_that_is_not_there_is_a_problem() =>
        Assert.Equal(["leases.csv:1: column price is not in the header"], CsvText.Words(CsvText.Read("a\n1\n", new ColumnRequest("price", null))));

    [Fact]
    public void Bytes_of_another_encoding_are_refused_with_their_place()
    {
        byte[] latin1 = [.. "id,region\n1,north\n2,S"u8, 0xFC, .. "d\n"u8];

        Assert.Equal(
            ["leases.csv:3: found byte 0xFC at byte 4 of the line, expected UTF-8; store the file as UTF-8"],
            CsvText.Words(CsvText.ReadAll(CsvText.Source(latin1))));
    }

    [Fact]
    public void The_place_of_a_bad_byte_is_right_far_into_a_file_with_wide_characters()
    {
        // Two- and three-byte characters straddle the edges of the buffers.
        var line = "1,ünï€ñ\n";
        byte[] bytes = [.. "id,region\n"u8, .. Enumerable.Repeat(Encoding.UTF8.GetBytes(line), 30_000).SelectMany(b => b), .. "2,€"u8, 0x80, .. "\n"u8];

        Assert.Equal(
            ["leases.csv:30002: found byte 0x80 at byte 6 of the line, expected UTF-8; store the file as UTF-8"],
            CsvText.Words(CsvText.ReadAll(CsvText.Source(bytes))));
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Sixteen_bit_text_is_refused(bool bigEndian)
    {
        var encoding = new UnicodeEncoding(bigEndian, byteOrderMark: true);
        byte[] bytes = [.. encoding.GetPreamble(), .. encoding.GetBytes("a,b\n1,2\n")];

        Assert.Equal(
            [$"leases.csv:1: found byte 0x{(bigEndian ? "FE" : "FF")} at byte 1 of the line, expected UTF-8; store the file as UTF-8"],
            CsvText.Words(CsvText.ReadAll(CsvText.Source(bytes))));
    }

    [Fact]
    public void A_character_cut_off_at_the_end_is_refused() =>
        Assert.Equal(
            ["leases.csv:2: found byte 0xE2 at byte 1 of the line, expected UTF-8; store the file as UTF-8"],
            CsvText.Words(CsvText.ReadAll(CsvText.Source([.. "a\n"u8, 0xE2, 0x82]))));

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Compressed_bytes_that_do_not_unpack_are_refused(bool cut)
    {
        var packed = CsvText.Gzip(Encoding.UTF8.GetBytes("a,b\n" + string.Concat(Enumerable.Range(0, 5000).Select(i => string.Create(CultureInfo.InvariantCulture, $"{i},{i * 7919 % 10007}\n")))));
        var source = CsvText.Source(cut ? packed[..(packed.Length / 2)] : "a,b\n1,2\n"u8.ToArray(), new DelimitedFormat(',', Gzip: true));

        Assert.Equal(["leases.csv: found bytes that do not unpack, expected a complete gzip file"], CsvText.Words(CsvText.ReadAll(source)));
    }

    [Fact]
    public void A_mark_that_never_closes_in_a_large_file_is_a_problem()
    {
        var source = CsvText.Source("a,b\n\"" + new string('x', 17_000_000));

        Assert.Equal(
            ["leases.csv: found a row of more than 16 million characters, expected a quotation mark that is opened to be closed"],
            CsvText.Words(CsvText.ReadAll(source)));
    }
}
