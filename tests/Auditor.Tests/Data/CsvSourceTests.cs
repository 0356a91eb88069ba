using System.Globalization;
using System.Text;
using Auditor.Data;

namespace Auditor.Tests.Data;

public sealed class CsvSourceTests
{
    [Theory]
    [InlineData("\n")]
    [InlineData("\r\n")]
    public void Reads_quoted_fields_with_separators_marks_and_line_ends(string end)
    {
        var table = CsvText.Table($"name,\"price, net\"{end}\"a, \"\"b\"\"{end}c\",1.5{end}plain,2{end}");

        Assert.Equal(["name", "price, net"], table.SourceColumns);
        Assert.Equal([$"a, \"b\"{end}c", "plain"], table.Texts("name"));
        Assert.Equal([1.5, 2], table.Numbers("price, net"));
    }

    [Fact]
    public void A_byte_order_mark_is_no_part_of_the_first_name()
    {
        var source = CsvText.Source([0xEF, 0xBB, 0xBF, .. "price\n1\n"u8]);

        Assert.Equal(["price"], source.ReadColumnNames().Value!);
        Assert.Equal([1], CsvText.ReadAll(source).Value!.Numbers("price"));
    }

    [Theory]
    [InlineData("leases.csv")]
    [InlineData("leases.TSV")]
    [InlineData("leases.csv.gz")]
    [InlineData("old.leases.tsv.GZ")]
    public void The_name_tells_the_format(string name)
    {
        var format = DelimitedFormat.FromFileName(name)!;
        var text = Encoding.UTF8.GetBytes($"price{format.Separator}region\n1{format.Separator}south, far\n".Replace("south, far", format.Separator == ',' ? "\"south, far\"" : "south, far", StringComparison.Ordinal));
        var table = CsvText.ReadAll(CsvText.Source(format.Gzip ? CsvText.Gzip(text) : text, format)).Value!;

        Assert.Equal(name.EndsWith("gz", StringComparison.OrdinalIgnoreCase), format.Gzip);
        Assert.Equal([1], table.Numbers("price"));
        Assert.Equal(["south, far"], table.Texts("region"));
    }

    [Theory]
    [InlineData("leases.parquet")]
    [InlineData("leases")]
    [InlineData("leases.gz")]
    [InlineData("csv")]
    public void Another_name_has_no_format(string name) => Assert.Null(DelimitedFormat.FromFileName(name));

    [Fact]
    public void Only_requested_columns_are_parsed_and_in_the_order_of_the_request()
    {
        var reading = CsvText.Read("a,b,c\nx,1,2\n5,3,oops\n6,4,8\n7,4,8\n", [new ColumnRequest("b", null), new ColumnRequest("a", ColumnKind.Text)]);

        Assert.Equal(["b", "a"], reading.Value!.Columns.Select(column => column.Name));
        Assert.Equal(["a", "b", "c"], reading.Value.SourceColumns);
        Assert.Equal(["x", "5", "6", "7"], reading.Value.Texts("a"));
    }

    [Theory]
    [InlineData("price\n1\n2\n\n")]
    [InlineData("price\n1\n2\n\n\n\r\n")]
    [InlineData("price\n1\n2")]
    public void Blank_lines_at_the_end_are_no_rows(string text) => Assert.Equal([1, 2], CsvText.Table(text).Numbers("price"));

    [Fact]
    public void Blank_lines_at_the_end_of_several_columns_are_no_rows() =>
        Assert.Equal(2, CsvText.Table("price,age\r\n1,2\r\n3,4\r\n\r\n\r\n").RowCount);

    [Fact]
    public void In_a_file_of_one_column_a_blank_line_between_rows_is_an_empty_cell() =>
        Assert.Equal([1, double.NaN, 3], CsvText.Table("price\n1\n\n3\n").Numbers("price"));

    [Fact]
    public void Levels_are_numbered_as_they_first_appear_and_keep_their_white_space()
    {
        var column = Assert.IsType<LevelsColumn>(CsvText.Table("id,region\n1,south\n2,north\n3,south \n4,NA\n5,north\n")["region"]);

        Assert.Equal(["south", "north", "south "], column.Texts);
        Assert.Equal([0, 1, 2, -1, 1], column.Codes);
    }

    [Fact]
    public void More_rows_than_the_sample_and_than_the_estimate_are_read()
    {
        // The first thousand rows are long and the rest short, so the estimate of the row count is far too small.
        var text = new StringBuilder("id,note\n");
        var wide = new string('w', 400);
        for (var i = 0; i < 30_000; i++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{i},{(i < 1000 ? wide : "n")}\n");
        }

        var table = CsvText.Table(text.ToString());

        Assert.Equal(Enumerable.Range(0, 30_000).Select(i => (double)i), table.Numbers("id"));
    }

    [Fact]
    public void Every_finite_number_comes_back_to_the_last_bit()
    {
        double[] values = [289203891, 0.1, 1e-320, double.MaxValue, -2.5e-8, 9007199254740993, 1 / 3.0];
        var text = "x\n" + string.Join('\n', values.Select(value => value.ToString("R", CultureInfo.InvariantCulture)));

        Assert.Equal(values, CsvText.Table(text).Numbers("x"));
    }

    [Fact]
    public void A_culture_with_a_decimal_comma_changes_nothing()
    {
        DataTable? table = null;
        var thread = new Thread(() => table = CsvText.Table("x,d,comma\n1.5,2020-01-31,\"1,5\"\n")) { CurrentCulture = new CultureInfo("de-DE") };
        thread.Start();
        thread.Join();

        Assert.Equal([1.5], table!.Numbers("x"));
        Assert.Equal(["1.5"], table!.Texts("x"));
        Assert.Equal(["2020-01-31"], table!.Texts("d"));
        Assert.Equal(ColumnKind.Levels, table!["comma"].Kind);
    }
}
