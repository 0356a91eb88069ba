using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;
using static Auditor.Tests.Design.Binding;

namespace Auditor.Tests.Design;

/// <summary>Expected columns by hand, from the rules of the declaration's format: treatment coding against the first level.</summary>
public sealed class LevelsBindingTests
{
    private static readonly DataTable _regions = Table(Levels("region", "south", "north", null, "east", "north"));

    [Fact]
    public void Undeclared_levels_stand_in_order_and_the_first_is_the_reference()
    {
        var term = Bind(_regions, Region);

        Assert.Equal(["region = north", "region = south"], term.ColumnLabels);
        Assert.Equal([[0, 1, 0, 0, 1], [1, 0, 0, 0, 0]], term.Columns());
        Assert.Equal(["region"], term.Sources.Select(source => source.Name));
    }

    [Fact]
    public void Numbers_are_ordered_by_value_and_text_by_code_point()
    {
        Assert.Equal(["m = 9", "m = 10"], Bind(Table(Levels("m", "10", "9", "-2")), new ColumnTerm("m")).ColumnLabels);
        Assert.Equal(["m = 9", "m = x"], Bind(Table(Levels("m", "10", "9", "x")), new ColumnTerm("m")).ColumnLabels);
        Assert.Equal(["m = Z", "m = a", "m = ä"], Bind(Table(Levels("m", "ä", "a", "Z", "B")), new ColumnTerm("m")).ColumnLabels);

        // U+FF5E before U+1F69C, although the first 16-bit unit of the latter is D83D.
        Assert.Equal(["m = \U0001F69C"], Bind(Table(Levels("m", "\U0001F69C", "\uFF5E")), new ColumnTerm("m")).ColumnLabels);
    }

    [Fact]
    public void Declared_levels_give_the_order()
    {
        var term = Bind(_regions, Region, declared: Declared(null, "south", "north", "east"));

        Assert.Equal(["region = north", "region = east"], term.ColumnLabels);
        Assert.Equal([[0, 1, 0, 0, 1], [0, 0, 0, 1, 0]], term.Columns());
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void A_declared_reference_goes_to_the_front(bool levels)
    {
        var declared = levels ? Declared("south", "north", "east", "south") : Declared("south");

        Assert.Equal(levels ? ["region = north", "region = east"] : ["region = east", "region = north"], Bind(_regions, Region, declared: declared).ColumnLabels);
    }

    [Fact]
    public void Levels_are_those_of_the_kept_rows()
    {
        var term = Bind(_regions, Region, [0, 1, 2, 4]);

        Assert.Equal(["region = south"], term.ColumnLabels);
        Assert.Equal([[1, 0, 0, 0, 0]], term.Columns());
    }

    [Fact]
    public void A_declared_level_without_rows_is_noted_once_and_makes_no_column()
    {
        var binder = Binder(_regions, null, null, Declared(null, "west", "north", "east", "south"));

        Assert.Equal(["region = east", "region = south"], binder.Bind(Region).Value!.ColumnLabels);
        Assert.Equal(2, binder.Bind(new ProductTerm([Region, Region])).Value!.ColumnLabels.Count / 2);
        Assert.Equal([new LevelWithoutRows("region", "west")], binder.Notes);
    }

    [Fact]
    public void One_level_makes_no_columns_and_is_noted()
    {
        var binder = Binder(_regions, [1, 4], null);
        var term = binder.Bind(Region).Value!;

        Assert.Empty(term.ColumnLabels);
        Assert.Empty(term.Columns());
        Assert.Equal([new SingleLevel("region", "north")], binder.Notes);
        Assert.Empty(binder.Bind(new ProductTerm([Region, new IndicatorTerm(Region, "north")])).Value!.ColumnLabels);
    }

    [Fact]
    public void What_is_wrong_with_levels_is_said_with_the_nearest_name()
    {
        Assert.Equal(
            ["model.yaml:7: row 1, column region: found 'south', expected one of the declared levels; did you mean 'soth'?"],
            Refused(_regions, Region, Declared(null, "north", "east", "soth")));
        Assert.Equal(
            ["model.yaml:7: the reference 'nort' is not a level that column region has on the kept rows; did you mean 'north'?"],
            Refused(_regions, Region, Declared("nort")));
        Assert.Equal(
            ["model.yaml:3: column region has no value on the kept rows"],
            Refused(Table(Levels("region", null, null)), Region with { Line = 3 }));
    }

    [Fact]
    public void A_problem_of_a_column_is_listed_once_for_a_term_that_names_it_twice() =>
        Assert.Single(Refused(_regions, new ProductTerm([Region, new IndicatorTerm(Region, "north")]), Declared("nort")));

    [Fact]
    public void Dates_and_text_are_no_terms_and_the_ways_out_are_named()
    {
        var table = Table(Dates("opened", "2020-01-31"), new TextColumn("note", ["n"]));

        Assert.Equal(["model.yaml:4: opened holds dates and is no number: use step, pulse, season or trend of it"], Refused(table, Opened with { Line = 4 }));
        Assert.Equal(["model.yaml: note is text: declare it with kind: levels or kind: number to use it as a term"], Refused(table, new ColumnTerm("note")));
    }

    private static ColumnDeclaration Declared(string? reference, params string[] levels) =>
        new("region", ColumnKind.Levels, reference, levels.Length > 0 ? levels : null, 7);
}
