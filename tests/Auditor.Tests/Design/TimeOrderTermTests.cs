using System.Text.Json;
using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;
using static Auditor.Tests.Design.Binding;

namespace Auditor.Tests.Design;

/// <summary>Lags, changes and moving averages: on panels with gaps against R (values/make_time_values.R), and by hand.</summary>
public sealed class TimeOrderTermTests
{
    private static readonly JsonElement _panels = JsonDocument.Parse(
        File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Design", "values", "time-values.json"))).RootElement;

    private static readonly TransformTerm _log = new(NumberTransform.Log, Price);

    public static TheoryData<Period, string, int> Cases => new(
        from period in new[] { Period.Quarter, Period.Month, Period.Week, Period.Year }
        from term in Terms.Keys.Order(StringComparer.Ordinal)
        from kept in new[] { 0, 2 }
        select (period, term, kept));

    private static Dictionary<string, Term> Terms { get; } = new()
    {
        ["lag_1"] = Lag(Price, 1),
        ["lag_3"] = Lag(Price, 3),
        ["change_1"] = Change(Price, 1),
        ["change_log_2"] = Change(_log, 2),
        ["moving_average_3"] = Average(Price, 3),
        ["lag_of_change_of_log"] = Lag(Change(_log, 1), 1),
    };

    /// <summary>Values are built before the filter: dropping every other row changes nothing in the rest.</summary>
    [Theory]
    [MemberData(nameof(Cases))]
    public void A_panel_with_gaps_gives_the_values_of_R(Period period, string name, int keepEvery)
    {
        var panel = Panel(period);
        var rows = AllRows(panel).Where(row => keepEvery == 0 || row % keepEvery == 0).ToArray();
        var term = Bound(panel, Terms[name], Axis(panel, period), rows);

        Assert.Equal([Terms[name].Label], term.ColumnLabels);
        Compare(_panels.GetProperty(PeriodName(period)).GetProperty(name), term, rows);
    }

    [Theory]
    [InlineData("lag_1")]
    [InlineData("lag_of_change_of_log")]
    [InlineData("moving_average_3")]
    public void A_number_as_time_steps_by_one(string name)
    {
        var panel = Panel(Period.Month);
        var number = new NumberColumn("number", [.. _panels.GetProperty("month").GetProperty("number").EnumerateArray().Select(Number)]);

        Compare(_panels.GetProperty("month").GetProperty(name), Bound(panel, Terms[name], TimeAxis.Of(number)), AllRows(panel));
    }

    [Fact]
    public void Labels_of_periods_are_those_of_R()
    {
        foreach (var period in new[] { Period.Quarter, Period.Month, Period.Week, Period.Year })
        {
            var panel = Panel(period);
            var periods = Axis(panel, period).Periods;
            Assert.Equal(
                _panels.GetProperty(PeriodName(period)).GetProperty("label").EnumerateArray().Select(item => item.GetString()),
                AllRows(panel).Select(row => periods[row] < 0 ? null : periods.Label(periods[row])));
        }
    }

    [Fact]
    public void The_files_own_order_has_no_gaps_and_runs_within_units()
    {
        var table = Table(Numbers("price", 1, 10, 3, double.NaN, 6, 20, 30), Levels("dealer", "a", "b", "a", null, "a", "b", "b"));
        var units = ClassedRows.Of(table["dealer"]);

        Same([double.NaN, double.NaN, 1, double.NaN, 3, 10, 20], Bound(table, Lag(Price, 1), TimeAxis.OfFileOrder(7, units), units: units));
        Same([double.NaN, 9, -7, double.NaN, double.NaN, 14, 10], Bound(table, Change(Price, 1), TimeAxis.OfFileOrder(7, null)));
        Same([double.NaN, double.NaN, double.NaN, double.NaN, 10.0 / 3, double.NaN, 20], Bound(table, Average(Price, 3), TimeAxis.OfFileOrder(7, units), units: units));
    }

    [Fact]
    public void A_longer_step_than_there_are_periods_leaves_no_value()
    {
        var table = Table(Numbers("price", 1, 2, 3));

        Same([double.NaN, double.NaN, double.NaN], Bound(table, Lag(Price, 3), TimeAxis.OfFileOrder(3, null)));
        Same([double.NaN, double.NaN, double.NaN], Bound(table, Average(Price, 1_000_000), TimeAxis.OfFileOrder(3, null)));
        Same([double.NaN, double.NaN, 2], Bound(table, Average(Price, 3), TimeAxis.OfFileOrder(3, null)));
    }

    [Fact]
    public void They_stand_wherever_one_number_can()
    {
        var table = Table(Numbers("price", 4, 9, 1, 25), Levels("region", "n", "s", "n", "s"));
        var time = TimeAxis.OfFileOrder(4, null);

        var root = Bound(table, new TransformTerm(NumberTransform.Sqrt, Lag(Price, 1)), time);
        Same([double.NaN, 2, 3, 1], root);
        Assert.Equal(["sqrt(lag(price, 1))"], root.ColumnLabels);
        var product = Bound(table, new ProductTerm([Lag(Price, 1), Region]), time);
        Assert.Equal(["lag(price, 1) * region = s"], product.ColumnLabels);
        Same([double.NaN, 4, 0, 1], product);
        Same([double.NaN, 5, -8, 24], Bound(table, new MinusTerm(Price, Lag(Price, 1)), time));
    }

    /// <summary>The mean that centres is that of the kept rows with a value: rows 1 and 3 have 4 and 1 a step before them.</summary>
    [Fact]
    public void What_depends_on_the_data_depends_on_the_kept_rows() => Same(
        [double.NaN, 1.5, 6.5, -1.5],
        Bound(Table(Numbers("price", 4, 9, 1, 25)), new TransformTerm(NumberTransform.Center, Lag(Price, 1)), TimeAxis.OfFileOrder(4, null), [0, 1, 3]));

    [Fact]
    public void What_cannot_be_is_said()
    {
        var table = Table(Numbers("price", 1, 2, 3), Levels("region", "n", "s", "n"), Dates("opened", "2020-01-01", "2020-01-09", "2020-02-01"), Numbers("year", 2020, 2020.5, 2021));
        var units = ClassedRows.Of(table["region"]);
        Term lag = Lag(Price, 1) with { Line = 9 };

        Assert.Equal(["model.yaml:9: lag(price, 1): no order of the rows is declared (data.time)"], Messages(table, lag, null, null));
        Assert.Equal(
            ["model.yaml:9: lag(region, 1): region holds levels, expected a number"],
            Messages(table, Lag(Region, 1) with { Line = 9 }, TimeAxis.OfFileOrder(3, null), null));
        Assert.Equal(
            ["model.yaml:4: data.time: lag, change and moving_average count periods, but opened holds dates: declare data.period (day, week, month, quarter or year), the step to count in"],
            Messages(table, lag, TimeAxis.Of((DateColumn)table["opened"], null), null));
        Assert.Equal(
            ["model.yaml:4: data.time: lag, change and moving_average count periods, but year has 2020.5 in row 2, and time as a number steps by 1: number the periods with whole numbers, or use dates and data.period"],
            Messages(table, lag, TimeAxis.Of((NumberColumn)table["year"]), null));
        Assert.Equal(
            ["model.yaml:4: data.time: rows 1 and 2 both lie in 2020-01; lag, change and moving_average need one row for each period (or is data.unit missing?)"],
            Messages(table, lag, TimeAxis.Of((DateColumn)table["opened"], Period.Month), null));
        Assert.Equal(
            ["model.yaml:4: data.time: rows 1 and 3 both lie in 2020 of region n; lag, change and moving_average need one row for each period of a unit"],
            Messages(table, lag, TimeAxis.Of((DateColumn)table["opened"], Period.Year), units));
        Assert.Empty(Messages(table, lag, TimeAxis.Of((DateColumn)table["opened"], Period.Month), units));
    }

    [Fact]
    public void Many_rows_of_one_period_are_counted()
    {
        var table = Table(Numbers("price", new double[9]), Numbers("year", 1, 1, 1, 1, 2, 2, 2, 2, 2));
        var messages = Messages(table, Lag(Price, 1), TimeAxis.Of((NumberColumn)table["year"]), null);

        Assert.Equal(6, messages.Length);
        Assert.StartsWith("model.yaml:4: data.time: rows 6 and 7 both lie in 2;", messages[4], StringComparison.Ordinal);
        Assert.Equal("model.yaml:4: data.time: 2 more pairs of rows like these", messages[5]);
    }

    private static TimeOrderTerm Lag(Term of, int by) => new(TimeOrderOperation.Lag, of, by);

    private static TimeOrderTerm Change(Term of, int by) => new(TimeOrderOperation.Change, of, by);

    private static TimeOrderTerm Average(Term of, int over) => new(TimeOrderOperation.MovingAverage, of, over);

    private static string PeriodName(Period period) => period.ToString().ToLowerInvariant();

    private static double Number(JsonElement item) => item.ValueKind == JsonValueKind.Number ? item.GetDouble() : double.NaN;

    private static DataTable Panel(Period period)
    {
        var panel = _panels.GetProperty(PeriodName(period));
        return Table(
            Numbers("price", [.. panel.GetProperty("price").EnumerateArray().Select(Number)]),
            Dates("opened", [.. panel.GetProperty("opened").EnumerateArray().Select(item => item.GetString())]),
            Levels("dealer", [.. panel.GetProperty("dealer").EnumerateArray().Select(item => item.GetString())]));
    }

    private static TimeAxis Axis(DataTable panel, Period period) => TimeAxis.Of((DateColumn)panel["opened"], period);

    private static BoundTerm Bound(DataTable table, Term term, TimeAxis time, int[]? kept = null, ClassedRows? units = null)
    {
        units ??= time.Column is null ? null : ClassedRows.Of(table["dealer"]);
        var reading = Binder(table, kept, time, units).Bind(term);
        Assert.Empty(reading.Problems);
        return reading.Value!;
    }

    private static string[] Messages(DataTable table, Term term, TimeAxis? time, ClassedRows? units) =>
        [.. Binder(table, null, time, units).Bind(term).Problems.Select(problem => problem.ToString())];

    private static TermBinder Binder(DataTable table, int[]? kept, TimeAxis? time, ClassedRows? units) =>
        new(table, new RowSubset(kept ?? AllRows(table)), new Dictionary<string, ColumnDeclaration>(), null, Model, time is null ? null : new TimeOrder(time, units, 4));

    private static bool IsMissing(BoundTerm term, int row) => term.Sources.Any(source => source.IsMissing(row));

    /// <summary>NaN stands for a missing value.</summary>
    private static void Same(double[] expected, BoundTerm term)
    {
        var values = term.Columns()[0];
        Assert.Equal(expected, values.Select((value, row) => IsMissing(term, row) ? double.NaN : value));
    }

    /// <summary>Null is missing, "undefined" a value that does not exist although its cells do.</summary>
    private static void Compare(JsonElement expected, BoundTerm term, int[] rows)
    {
        var values = term.Columns(rows)[0];
        var items = expected.EnumerateArray().ToArray();
        foreach (var (at, row) in rows.Index())
        {
            Assert.Equal(items[row].ValueKind == JsonValueKind.Null, IsMissing(term, row));
            if (items[row].ValueKind == JsonValueKind.Number)
            {
                Assert.Equal(items[row].GetDouble(), values[at], 1e-13 * Math.Max(1, Math.Abs(values[at])));
            }
            else
            {
                Assert.False(double.IsFinite(values[at]));
            }
        }

        Assert.True(rows.Count(row => items[row].ValueKind == JsonValueKind.Number) >= 5);
    }
}
