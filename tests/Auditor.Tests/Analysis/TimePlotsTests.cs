using System.Globalization;
using System.Text;
using System.Text.Json;
using Auditor.Reporting;
using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Tests.Analysis;

/// <summary>What the pictures in time order are made of, against R (values/make_time_pictures.R), and where there is nothing to draw.</summary>
public sealed class TimePlotsTests
{
    private const double Digits9 = 1e-9;
    private static readonly Lazy<JsonElement> Values = new(() => JsonDocument.Parse(File.ReadAllText(
        Path.Combine(AppContext.BaseDirectory, "Analysis", "values", "time-pictures.json"))).RootElement);

    private static readonly Lazy<ResidualPlots> Panel = new(() => Plots(Reference(
        "petersen_panel", "  time: year\n  unit: firm\n  keep: [{column: y, from: -2}]\nresponse: y\nfinal_model: {terms: [x]}")));

    [Fact]
    public void One_series_has_the_autocorrelations_of_R()
    {
        var plots = Plots(Reference("us_consumption_lag", "  time: year\nresponse: con\nfinal_model: {terms: [gnp, gnp_lag1]}"));
        Near(List("series_correlations"), plots.Autocorrelations!.Lags.Select(lag => lag.Correlation));
        Assert.Equal(Enumerable.Range(1, 9), plots.Autocorrelations.Lags.Select(lag => lag.Lag));
        Assert.True(plots.InTime is { Single: true, Neighbours: 18, PeriodsOfPoint: 1 });
        Assert.Equal(Values.Value.GetProperty("series_same_side").GetInt32(), plots.InTime.SameSide);
        Assert.Equal(Enumerable.Range(1964, 19).Select(year => (double)year), plots.InTime.Points.Select(point => point.X));
        Assert.All(plots.InTime.Points.Skip(1), point => Assert.True(point.Follows));
    }

    /// <summary>Beside R, the band is Ljung and Box's: r² n (n + 2) / m is chi-square on 1, whose 95 % point is 1.96².</summary>
    [Fact]
    public void In_a_panel_only_pairs_of_one_unit_and_that_far_apart_count()
    {
        var plot = Panel.Value.Autocorrelations!;
        Near(List("panel_correlations"), plot.Lags.Select(lag => lag.Correlation));
        Near(List("panel_pairs"), plot.Lags.Select(lag => (double)lag.Pairs));
        Assert.All(plot.Lags, lag => Assert.Equal(1.959963984540054 * 1.959963984540054, lag.Band * lag.Band * plot.Rows * (plot.Rows + 2.0) / lag.Pairs, 1e-9));
    }

    [Fact]
    public void A_panel_is_shown_by_the_mean_and_the_middle_half_of_each_period()
    {
        var plot = Panel.Value.InTime!;
        Near(List("panel_means"), plot.Points.Select(point => point.Mean));
        Near(List("panel_lower"), plot.Points.Select(point => point.Lower));
        Near(List("panel_upper"), plot.Points.Select(point => point.Upper));
        Near(List("panel_counts"), plot.Points.Select(point => point.Count));
        Near([Values.Value.GetProperty("panel_between").GetDouble()], [plot.Between]);
        Assert.True(plot is { Single: false, Units: > 400, Periods: 10 });
    }

    [Fact]
    public void A_missing_period_breaks_the_line_and_no_pair_reaches_over_it()
    {
        var plots = Plots(Series(30, row => row < 12 ? row : row + 3), "  time: t\n");
        Assert.Equal([0, 12], plots.InTime!.Points.Index().Where(pair => !pair.Item.Follows).Select(pair => pair.Index));
        Assert.Equal(28, plots.InTime.Neighbours);
        Assert.Equal(28, plots.Autocorrelations!.Lags[0].Pairs);
    }

    [Fact]
    public void Many_periods_are_put_together_in_runs()
    {
        var plot = Plots(Series(1000, row => row), "  time: t\n").InTime!;
        Assert.True(plot is { Single: false, PeriodsOfPoint: 3, Periods: 1000, Neighbours: 999 });
        Assert.Equal(334, plot.Points.Count);
        Assert.Equal(1000, plot.Points.Sum(point => point.Count));
    }

    [Theory]
    [InlineData("day", 12, "01-10", "01-13", "01-16", "01-19")]
    [InlineData("month", 12, "2001-01", "2001-04", "2001-07", "2001-10")]
    [InlineData("month", 24, "2001-01", "2001-07", "2002-01", "2002-07", "2003-01")]
    [InlineData("year", 30, "2000", "2010", "2020", "2030")]
    public void Dates_stand_on_the_axis_as_round_dates(string period, int rows, params string[] expected)
    {
        var start = new DateOnly(2001, 1, 10);
        DateOnly Day(int row) => period switch { "day" => start.AddDays(row), "month" => start.AddMonths(row), _ => start.AddYears(row) };
        string csv = Series(rows, row => row, row => Day(row).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture));
        Assert.Equal(expected, Pictures(Record(csv, $"  time: t\n  period: {period}\n"))[4].XTicks.Select(tick => tick.Text));
    }

    [Fact]
    public void Without_a_time_there_is_no_such_picture()
    {
        var record = Record(Series(30, row => row), "");
        Assert.Null(record.Plots!.Plots!.InTime);
        Assert.Null(record.Plots.Plots.Autocorrelations);
        Assert.Equal(4, Pictures(record).Count);
    }

    [Fact]
    public void Where_no_picture_is_asked_for_none_is_made()
    {
        var inputs = AuditRunner.Inputs(Declaration("  time: t\n"), _ => new MemoryStream(Encoding.UTF8.GetBytes(Series(30, row => row)))).Value! with { Pictures = false };
        Assert.Null(Audit.Run(inputs).Value!.Plots!.Plots);
    }

    [Fact]
    public void Rows_that_share_a_period_without_a_unit_are_shown_by_period_alone()
    {
        var plots = Plots(Series(60, row => row / 5), "  time: t\n");
        Assert.True(plots.InTime is { Single: false, Periods: 12, Neighbours: null, Units: null });
        Assert.Null(plots.Autocorrelations);
    }

    private static IReadOnlyList<Picture> Pictures(AuditRecord record) => ResidualPictures.Of(record, 0.05);

    private static ResidualPlots Plots(AuditRecord record) => record.Plots!.Plots!;

    private static ResidualPlots Plots(string csv, string structure) => Plots(Record(csv, structure));

    private static AuditRecord Record(string csv, string structure) => AuditRunner.Record(Declaration(structure), _ => new MemoryStream(Encoding.UTF8.GetBytes(csv)));

    private static string Declaration(string structure) =>
        "audit: 1\nmodel: {id: in-time}\ndata:\n  source: data.csv\n" + structure + "response: y\nfinal_model: {terms: [x]}\n";

    private static AuditRecord Reference(string name, string rest) => AuditRunner.Record(
        "audit: 1\nmodel: {id: in-time}\ndata:\n  source: data.csv\n" + rest + "\n",
        file => File.OpenRead(Path.Combine(TestFolders.Reference, name, file)));

    private static string Series(int rows, Func<int, int> period, Func<int, string>? time = null)
    {
        var text = new StringBuilder("t,x,y\n");
        for (var row = 0; row < rows; row++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{time?.Invoke(row) ?? period(row).ToString(CultureInfo.InvariantCulture)},{row * 7 % 11},{Math.Sin(row * 0.9) + (0.3 * Math.Cos(row * row))}\n");
        }

        return text.ToString();
    }

    private static double[] List(string name) => [.. Values.Value.GetProperty(name).EnumerateArray().Select(value => value.GetDouble())];

    private static void Near(IEnumerable<double> expected, IEnumerable<double> found)
    {
        double[] all = [.. expected];
        double[] values = [.. found];
        Assert.Equal(all.Length, values.Length);
        Assert.All(all.Zip(values), pair => Assert.Equal(pair.First, pair.Second, Digits9 * Math.Max(1e-3, Math.Abs(pair.First))));
    }
}
