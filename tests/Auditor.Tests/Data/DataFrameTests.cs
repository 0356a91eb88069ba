using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using Auditor.Data;
using Auditor.Declaration;
using Microsoft.Data.Analysis;

namespace Auditor.Tests.Data;

public sealed class DataFrameTests
{
    [Fact]
    public void Number_columns_stand_on_the_same_memory()
    {
        var table = CsvText.Table("x\n289203891\nNA\n0.1\n");
        var values = table.Numbers("x");
        var column = Assert.IsType<DoubleDataFrameColumn>(DataFrameView.Of(table)["x"]);
        var buffer = Assert.Single(column.GetReadOnlyDataBuffers()).Span;

        Assert.True(Unsafe.AreSame(ref MemoryMarshal.GetReference(buffer), ref values[0]));
        values[2] = 7;
        Assert.Equal(7, column[2]);
    }

    [Fact]
    public void No_digit_is_lost_and_missing_values_are_null()
    {
        var column = Assert.IsType<DoubleDataFrameColumn>(DataFrameView.Of(CsvText.Table("x\n289203891\nNA\n0.1\n"))["x"]);

        Assert.Equal([289203891, null, 0.1], column.ToArray());
        Assert.Equal(1, column.NullCount);
        Assert.Equal(3, column.Length);
    }

    [Fact]
    public void More_rows_than_one_byte_of_the_validity_bits_holds()
    {
        double[] values = [.. Enumerable.Range(0, 1001).Select(i => i % 3 == 0 ? double.NaN : i)];
        var column = (DoubleDataFrameColumn)DataFrameView.Of(new DataTable(1001, ["x"], [new NumberColumn("x", values)]))["x"];

        Assert.Equal(values.Select(value => double.IsNaN(value) ? (double?)null : value), column.ToArray());
        Assert.Equal(334, column.NullCount);
    }

    [Fact]
    public void A_pinned_view_points_into_the_array()
    {
        double[] values = [1, 2, 3];
        using var bytes = new ArrayBytes(values);
        using var handle = bytes.Memory[8..].Pin();
        unsafe
        {
            Assert.Equal(2, *(double*)handle.Pointer);
        }
    }

    [Fact]
    public void Other_kinds_are_text()
    {
        var frame = DataFrameView.Of(CsvText.Table("region,opened\nsouth,2020-01-31\nNA,2020-02-29\n"));

        Assert.Equal(["south", null], (StringDataFrameColumn)frame["region"]);
        Assert.Equal(["2020-01-31", "2020-02-29"], (StringDataFrameColumn)frame["opened"]);
    }

    [Fact]
    public void A_table_seen_as_a_frame_and_read_back_is_the_same_table()
    {
        var table = CsvText.Table("x,region,opened\n289203891,south,2020-01-31\nNA,NA,2020-02-29\n0.1,north,NA\n");
        var back = Read(DataFrameView.Of(table)).Value!;

        Assert.Equal(table.Numbers("x"), back.Numbers("x"));
        Assert.Equal(table.Texts("region"), back.Texts("region"));
        Assert.Equal(((LevelsColumn)table["region"]).Codes, ((LevelsColumn)back["region"]).Codes);
        Assert.Equal(((DateColumn)table["opened"]).Days, ((DateColumn)back["opened"]).Days);
    }

    [Fact]
    public void Columns_of_every_number_type_are_numbers()
    {
        var frame = new DataFrame(
            new Int32DataFrameColumn("i", [1, null]),
            new Int64DataFrameColumn("l", [289203891, -1]),
            new SingleDataFrameColumn("f", [0.5f, float.NaN]),
            new DecimalDataFrameColumn("m", [0.1m, null]));
        var table = Read(frame).Value!;

        Assert.Equal([1, double.NaN], table.Numbers("i"));
        Assert.Equal([289203891, -1], table.Numbers("l"));
        Assert.Equal([0.5, double.NaN], table.Numbers("f"));
        Assert.Equal([0.1, double.NaN], table.Numbers("m"));
    }

    [Fact]
    public void Moments_without_a_time_of_day_are_dates()
    {
        var frame = new DataFrame(new DateTimeDataFrameColumn("opened", [new DateTime(2020, 1, 31, 0, 0, 0, DateTimeKind.Utc)]));

        Assert.Equal(["2020-01-31"], Read(frame).Value!.Texts("opened"));
    }

    [Fact]
    public void A_declared_kind_and_declared_missing_texts_hold_for_frames_too()
    {
        var frame = new DataFrame(new DoubleDataFrameColumn("month", [1, 2, 1]), new DoubleDataFrameColumn("age", [-99, 5, double.NaN]));
        var table = new DataFrameSource("leases", frame)
            .Read([new ColumnRequest("month", ColumnKind.Levels), new ColumnRequest("age", null)], ["-99"]).Value!;

        Assert.Equal(["1", "2", "1"], table.Texts("month"));
        Assert.Equal([double.NaN, 5, double.NaN], table.Numbers("age"));
    }

    [Fact]
    public void What_a_frame_cannot_give_is_a_problem()
    {
        var frame = new DataFrame(new DoubleDataFrameColumn("x", [1, double.PositiveInfinity]), new StringDataFrameColumn("n", ["1", "b"]));
        var source = new DataFrameSource("leases", frame);

        Assert.Equal(
            [
                "leases: row 2, column x: found 'Infinity', expected a finite number; declare x with kind: levels if its cells are names, or put the text under missing if it means no value",
                "leases: row 2, column n: found 'b', expected a finite number; declare n with kind: levels if its cells are names, or put the text under missing if it means no value",
            ],
            CsvText.Words(source.Read([new ColumnRequest("x", null), new ColumnRequest("n", ColumnKind.Number)], [])));
        Assert.Equal(["leases: column age is not in the data frame"], CsvText.Words(source.Read([new ColumnRequest("age", null)], [])));
        Assert.Equal(
            ["leases: found no data rows, expected at least one row"],
            CsvText.Words(new DataFrameSource("leases", new DataFrame(new DoubleDataFrameColumn("x", 0))).Read([new ColumnRequest("x", null)], [])));
    }

    private static Reading<DataTable> Read(DataFrame frame)
    {
        var source = new DataFrameSource("leases", frame);
        return source.Read([.. source.ReadColumnNames().Value!.Select(name => new ColumnRequest(name, null))], DataDeclaration.DefaultMissing);
    }
}
