using System.Globalization;
using Auditor.Data;

namespace Auditor.Tests.Data;

public sealed class InferredKindTests
{
    [Theory]
    [InlineData("1;-2.5;+3e2;.5;5.; 6 ;\t7", ColumnKind.Number)]
    [InlineData("1;2;x;x", ColumnKind.Levels)] // exactly half is not more than half
    [InlineData("2020-01-31;2020-02-29", ColumnKind.Date)]
    [InlineData("2020-01-31;1;north", ColumnKind.Levels)] // no kind has more than half
    [InlineData("NA;;NaN;null", ColumnKind.Number)] // no value at all
    [InlineData("1,5;2,5", ColumnKind.Levels)] // a decimal comma is no number
    [InlineData("1,500;2,500", ColumnKind.Levels)] // nor is a thousands mark
    [InlineData("1e400;Infinity;-Infinity", ColumnKind.Levels)]
    [InlineData("0x10;1_000", ColumnKind.Levels)]
    [InlineData("31.12.2020;2020/12/31;2020-2-3", ColumnKind.Levels)]
    [InlineData("2021-02-29;2021-13-01", ColumnKind.Levels)] // no such days
    [InlineData("True;False", ColumnKind.Levels)]
    public void More_than_half_of_the_cells_decide(string cells, ColumnKind kind)
    {
        var text = "id,x\n" + string.Concat(cells.Split(';').Select((cell, i) => string.Create(CultureInfo.InvariantCulture, $"{i},\"{cell}\"\n")));

        Assert.Equal(kind, CsvText.Table(text)["x"].Kind);
    }

    [Theory]
    [InlineData("7", "north", ColumnKind.Levels)]
    [InlineData("north", "7", ColumnKind.Number)]
    [InlineData("7", "2020-01-31", ColumnKind.Date)]
    [InlineData("2020-01-31", "7", ColumnKind.Number)]
    [InlineData("2020-01-31", "north", ColumnKind.Levels)]
    [InlineData("north", "2020-01-31", ColumnKind.Date)]
    public void All_rows_decide_and_not_the_first_ones(string first, string later, ColumnKind kind)
    {
        // The sample that guesses is 1,000 rows; the guess is wrong here and put right.
        var rows = Enumerable.Repeat(first, 1200).Concat(Enumerable.Repeat(later, 1300));
        var reading = CsvText.ReadAll("x\n" + string.Join('\n', rows));

        if (kind == ColumnKind.Levels)
        {
            var levels = Assert.IsType<LevelsColumn>(reading.Value!["x"]);
            Assert.Equal([first, later], levels.Texts);
        }
        else
        {
            var expected = kind == ColumnKind.Date ? "a date as YYYY-MM-DD" : "a finite number";
            Assert.Equal(11, reading.Problems.Count);
            Assert.Equal($"leases.csv: column x: 1190 more cells that are not {expected}", reading.Problems[10].ToString());
        }
    }

    [Fact]
    public void Text_that_means_no_value_counts_for_no_kind_and_is_missing()
    {
        var table = CsvText.ReadAll("x\n-99\n1\n -99\n-99.0\n", "-99").Value!;

        // Compared as it stands: neither with a blank before it nor written otherwise does it mean "no value".
        Assert.Equal([double.NaN, 1, -99, -99], table.Numbers("x"));
    }

    [Fact]
    public void White_space_alone_is_empty()
    {
        var table = CsvText.Table("x,y,d\n1, ,2020-01-31\n ,\"\",  \n3,north,2020-01-31\n");

        Assert.Equal([1, double.NaN, 3], table.Numbers("x"));
        Assert.Equal([null, null, "north"], table.Texts("y"));
        Assert.True(table["d"].IsMissing(1));
    }

    [Fact]
    public void When_empty_is_not_declared_missing_it_is_a_level()
    {
        var table = CsvText.ReadAll("id,x\n1,\n2,NA\n3,b\n", "NA").Value!;

        Assert.Equal(["", null, "b"], table.Texts("x"));
    }

    [Fact]
    public void A_declared_kind_holds_whatever_the_cells_are()
    {
        var table = CsvText.Read("month,row\n1,007\n02,008\n1,NA\n", new ColumnRequest("month", ColumnKind.Levels), new ColumnRequest("row", ColumnKind.Text)).Value!;

        Assert.Equal(["1", "02"], Assert.IsType<LevelsColumn>(table["month"]).Texts);
        Assert.Equal(["007", "008", null], table.Texts("row"));
    }

    [Fact]
    public void Days_are_counted_from_the_first_of_January_of_year_1()
    {
        // 1970-01-01 is day 719162 after 0001-01-01 in the proleptic Gregorian calendar (rata die 719163, counted from 1).
        var column = Assert.IsType<DateColumn>(CsvText.Table("d\n1970-01-01\n0001-01-01\n").Columns[0]);

        Assert.Equal([719162, 0], column.Days);
    }
}
