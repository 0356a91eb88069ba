using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;
using static Auditor.Tests.Design.Binding;

namespace Auditor.Tests.Design;

/// <summary>Expected values by hand, from a calendar.</summary>
public sealed class IndicatorAndTimeBindingTests
{
    private static readonly DataTable _table = Table(
        Dates("opened", "2020-02-29", "2019-12-30", null, "2020-01-05", "2020-07-01", "2020-01-06"),
        Numbers("year", 2020, 2018.5, double.NaN, 2019, 2021, 2019),
        Levels("grade", "A", "C", null, "B", "C", "02"),
        new TextColumn("note", ["x", null, "y", "x", "z", "x"]));

    private static readonly ColumnTerm _year = new("year");
    private static readonly ColumnTerm _grade = new("grade");

    [Fact]
    public void An_indicator_compares_numbers_by_value_days_by_day_and_the_rest_by_text()
    {
        Assert.Equal([0, 0, 0, 1, 0, 1], Bind(_table, new IndicatorTerm(_year, "2.019e3")).Columns()[0]);
        Assert.Equal([0, 0, 0, 1, 0, 0], Bind(_table, new IndicatorTerm(Opened, "2020-01-05")).Columns()[0]);
        Assert.Equal([0, 1, 0, 0, 1, 0], Bind(_table, new IndicatorTerm(_grade, "C")).Columns()[0]);
        Assert.Equal([1, 0, 0, 1, 0, 1], Bind(_table, new IndicatorTerm(new ColumnTerm("note"), "x")).Columns()[0]);
        Assert.Equal(["grade = C"], Bind(_table, new IndicatorTerm(_grade, "C")).ColumnLabels);
    }

    [Fact]
    public void An_indicator_of_a_level_that_is_not_there_names_the_nearest_or_the_few_there_are()
    {
        Assert.Equal(["model.yaml:5: grade = 2: no kept row of column grade has '2'; did you mean '02'?"], Refused(_table, new IndicatorTerm(_grade, "2") { Line = 5 }));
        Assert.Equal(["model.yaml: region = sauth: no kept row of column region has 'sauth'; did you mean 'south'?"], Refused(Table(Levels("region", "south", "north")), new IndicatorTerm(Region, "sauth")));
        Assert.Equal(["model.yaml: note = west: no kept row of column note has 'west'; known: x, y, z"], Refused(_table, new IndicatorTerm(new ColumnTerm("note"), "west")));
        Assert.Equal(["model.yaml: year = new: column year holds numbers, found 'new'"], Refused(_table, new IndicatorTerm(_year, "new")));
        Assert.Equal(["model.yaml: opened = 2020: column opened holds dates, found '2020', expected YYYY-MM-DD"], Refused(_table, new IndicatorTerm(Opened, "2020")));
    }

    [Fact]
    public void An_indicator_that_no_row_meets_is_noted()
    {
        var binder = Binder(_table, null, null, new ColumnDeclaration("grade", ColumnKind.Levels, null, ["A", "B", "C", "02", "D"], 3));

        Assert.Equal([0, 0, 0, 0, 0, 0], binder.Bind(new IndicatorTerm(_year, "1999")).Value!.Columns()[0]);
        Assert.Equal([0, 0, 0, 0, 0, 0], binder.Bind(new IndicatorTerm(_grade, "D")).Value!.Columns()[0]);
        Assert.Equal([new ValueWithoutRows("year", "1999"), new ValueWithoutRows("grade", "D")], binder.Notes);
    }

    [Fact]
    public void Step_and_pulse_include_their_ends()
    {
        Assert.Equal([1, 0, 1, 0, 1], Bind(_table, new StepTerm(Opened, "2020-01-06")).Columns([0, 1, 5, 3, 4])[0]);
        Assert.Equal([0, 0, 1, 1, 0], Bind(_table, new PulseTerm(Opened, "2020-01-05", "2020-01-06")).Columns([0, 1, 5, 3, 4])[0]);
        Assert.Equal([1, 0, 1, 1, 1], Bind(_table, new StepTerm(_year, "2019")).Columns([0, 1, 5, 3, 4])[0]);
        Assert.Equal([1, 0, 1, 1, 0], Bind(_table, new PulseTerm(_year, "2019", "2020")).Columns([0, 1, 5, 3, 4])[0]);
        Assert.Equal(["opened from 2020-01-05 to 2020-01-06"], Bind(_table, new PulseTerm(Opened, "2020-01-05", "2020-01-06")).ColumnLabels);
        Assert.Equal(["model.yaml: grade from 3: grade holds neither dates nor numbers"], Refused(_table, new StepTerm(_grade, "3")));
        Assert.Equal(["model.yaml: year from 2020-01-31: column year holds numbers, found '2020-01-31'"], Refused(_table, new StepTerm(_year, "2020-01-31")));
        Assert.Equal(["model.yaml: opened from 2020-01-31 to 3: column opened holds dates, found '3', expected YYYY-MM-DD"], Refused(_table, new PulseTerm(Opened, "2020-01-31", "3")));
    }

    [Fact]
    public void Season_makes_a_column_for_each_season_that_occurs_but_the_lowest()
    {
        var quarter = Bind(_table, new SeasonTerm(Opened, Period.Quarter));
        Assert.Equal(["quarter(opened) = 3", "quarter(opened) = 4"], quarter.ColumnLabels);
        Assert.Equal([[0, 0, 0, 0, 1, 0], [0, 1, 0, 0, 0, 0]], quarter.Columns());

        var month = Bind(_table, new SeasonTerm(Opened, Period.Month), [0, 1, 2, 4]);
        Assert.Equal(["month(opened) = 7", "month(opened) = 12"], month.ColumnLabels);

        var binder = Binder(_table, [0, 3]);
        Assert.Empty(binder.Bind(new SeasonTerm(Opened, Period.Quarter)).Value!.ColumnLabels);
        Assert.Equal([new SingleLevel("quarter(opened)", "1")], binder.Notes);
        Assert.Equal(["model.yaml: quarter(year): year does not hold dates"], Refused(_table, new SeasonTerm(_year, Period.Quarter)));
    }

    [Theory]
    [InlineData(null, new double[] { 61, 0, 6, 184, 7 })]
    [InlineData(Period.Day, new double[] { 61, 0, 6, 184, 7 })]
    [InlineData(Period.Week, new double[] { 8, 0, 0, 26, 1 })] // 2019-12-30 and 2020-01-06 are Mondays
    [InlineData(Period.Month, new double[] { 2, 0, 1, 7, 1 })]
    [InlineData(Period.Quarter, new double[] { 1, 0, 1, 3, 1 })]
    [InlineData(Period.Year, new double[] { 1, 0, 1, 1, 1 })]
    public void Trend_counts_periods_since_the_earliest_kept_row(Period? period, double[] expected)
    {
        var term = Bind(_table, new TrendTerm(Opened), period: period);

        Assert.Equal(["trend(opened)"], term.ColumnLabels);
        Assert.Equal(expected, term.Columns([0, 1, 3, 4, 5])[0]);
    }

    [Fact]
    public void Trend_of_a_number_and_of_kept_rows_only()
    {
        Assert.Equal([1, -0.5, 0, 2], Bind(_table, new TrendTerm(_year), [0, 2, 3]).Columns([0, 1, 3, 4])[0]);
        Assert.Equal([-6, 0], Bind(_table, new TrendTerm(Opened), [3, 4]).Columns([1, 3])[0]);
        Assert.Equal(["model.yaml: trend(grade): grade holds neither dates nor numbers"], Refused(_table, new TrendTerm(_grade)));
        Assert.Equal(["model.yaml: trend(year): no kept row has a value"], [.. Binder(_table, [2]).Bind(new TrendTerm(_year)).Problems.Select(problem => problem.ToString())]);
    }
}
