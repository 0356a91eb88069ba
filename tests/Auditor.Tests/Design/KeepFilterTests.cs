using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;
using static Auditor.Tests.Design.Binding;

namespace Auditor.Tests.Design;

/// <summary>Expected rows by hand.</summary>
public sealed class KeepFilterTests
{
    private static readonly DataTable _table = Table(
        Numbers("age", 1, 2, double.NaN, 3, 2),
        Levels("status", "closed", "open", "closed", null, "Closed"),
        Levels("year", "2019", "2020", null, "2021.5", "02020"),
        Dates("opened", "2020-01-31", "2020-02-01", null, "2020-03-01", "2020-02-01"),
        new TextColumn("note", ["x", null, "y", "x", "z"]));

    [Fact]
    public void No_condition_keeps_every_row() => Kept([0, 1, 2, 3, 4]);

    [Fact]
    public void Numbers_are_compared_as_numbers()
    {
        Kept([1, 4], Values("age", KeepTest.EqualTo, "2.0"));
        Kept([0, 3], Values("age", KeepTest.Not, "2e0"));
        Kept([0, 3], Values("age", KeepTest.In, "1", "3"));
        Kept([1, 3, 4], Range("age", "2", "3"));
        Kept([1, 3, 4], Range("age", "1.5", null));
        Kept([0], Range("age", null, "1"));
        Kept([0, 1, 3, 4], Values("age", KeepTest.Present));
    }

    [Fact]
    public void Levels_and_text_are_compared_as_text()
    {
        Kept([0, 2], Values("status", KeepTest.EqualTo, "closed"));
        Kept([1, 4], Values("status", KeepTest.Not, "closed"));
        Kept([1, 4], Values("status", KeepTest.In, "open", "Closed"));
        Kept([1], Values("year", KeepTest.EqualTo, "2020"));
        Kept([0, 3], Values("note", KeepTest.EqualTo, "x"));
        Kept([2, 4], Values("note", KeepTest.Not, "x"));
    }

    [Fact]
    public void Levels_that_are_all_numbers_have_an_order()
    {
        Kept([1, 3, 4], Range("year", "2020", "2021.5"));
        Kept([0], Range("year", null, "2019"));
    }

    [Fact]
    public void Dates_are_compared_by_day()
    {
        Kept([1, 4], Values("opened", KeepTest.EqualTo, "2020-02-01"));
        Kept([0, 3], Values("opened", KeepTest.Not, "2020-02-01"));
        Kept([0, 1, 4], Range("opened", "2020-01-31", "2020-02-29"));
    }

    [Fact]
    public void Every_condition_must_hold() => Kept([1], Range("age", "2", null), Values("status", KeepTest.EqualTo, "open"));

    [Fact]
    public void What_cannot_be_compared_is_listed_by_line()
    {
        var reading = KeepFilter.Apply(
            _table,
            [
                Values("age", KeepTest.In, "1", "old") with { Line = 3 },
                Values("opened", KeepTest.EqualTo, "1.2.2020") with { Line = 4 },
                Range("status", "a", "b") with { Line = 5 },
                Range("note", "a", null) with { Line = 6 },
                Range("year", "old", null) with { Line = 7 },
            ],
            Model);

        Assert.Null(reading.Value);
        Assert.Equal(
            [
                "model.yaml:3: data.keep: column age holds numbers, found 'old'",
                "model.yaml:4: data.keep: column opened holds dates, found '1.2.2020', expected YYYY-MM-DD",
                "model.yaml:5: data.keep: from and to need numbers or dates, column status has cells that are neither",
                "model.yaml:6: data.keep: from and to need numbers or dates, column note has cells that are neither",
                "model.yaml:7: data.keep: column year holds numbers, found 'old'",
            ],
            reading.Problems.Select(problem => problem.ToString()));
    }

    [Fact]
    public void A_value_that_no_row_has_is_noted()
    {
        var kept = KeepFilter.Apply(_table, [Values("status", KeepTest.In, "closed", "shut"), Values("age", KeepTest.Not, "9")], Model).Value!;

        Assert.Equal([0], kept.Rows);
        Assert.Equal([new ValueWithoutRows("status", "shut"), new ValueWithoutRows("age", "9")], kept.Notes);
    }

    [Fact]
    public void A_filter_that_leaves_no_row_is_a_problem() =>
        Assert.Equal(
            ["model.yaml:8: data.keep: no row meets every condition"],
            KeepFilter.Apply(_table, [Range("age", "7", null)], Model).Problems.Select(problem => problem.ToString()));

    private static void Kept(int[] rows, params KeepCondition[] conditions)
    {
        var reading = KeepFilter.Apply(_table, conditions, Model);

        Assert.Equal(rows, reading.Value!.Rows);
        Assert.Empty(reading.Value.Notes);
    }

    private static KeepCondition Values(string column, KeepTest test, params string[] values) => new(column, test, values, null, null, 8);

    private static KeepCondition Range(string column, string? from, string? to) => new(column, KeepTest.Between, [], from, to, 8);
}
