using Auditor.Data;
using Auditor.Declaration;
using static Auditor.Tests.Design.Binding;

namespace Auditor.Tests.Design;

/// <summary>What BoundTerm promises, for every kind of term.</summary>
public sealed class BoundTermContractTests
{
    private static readonly DataTable _table = Table(
        Numbers("age", 1, 5, double.NaN, 60, 33, 0, 12, 80),
        Numbers("price", 4, double.NaN, 2, 0, 9, -1, 3, 7),
        Levels("region", "n", "s", null, "t", "n", "s", "s", "t"),
        Dates("opened", "2020-01-31", null, "2020-05-01", "2021-01-01", "2020-02-29", "2019-11-11", "2020-08-08", "2020-05-02"));

    private static readonly TransformTerm _log = new(NumberTransform.Log, Price);

    private static readonly Term[] _terms =
    [
        Age, Region, _log, new TransformTerm(NumberTransform.Center, Age), new PowerTerm(Price, 2), new RatioTerm(Age, Price), new MinusTerm(Age, Price),
        new WinsoriseTerm(Age, 0.1, 0.9), new CapTerm(Age, 2, null), new PolynomialTerm(Age, 4), new SplineTerm(Age, [1, 12, 33, 60]),
        new BinsTerm(Age, [5, 33]), new IndicatorTerm(Region, "s"), new StepTerm(Opened, "2020-05-01"), new PulseTerm(Opened, "2020-02-01", "2020-05-01"),
        new SeasonTerm(Opened, Period.Quarter), new SeasonTerm(Opened, Period.Month), new TrendTerm(Opened), new TrendTerm(Age),
        new ProductTerm([Region, new PolynomialTerm(Age, 2), new SeasonTerm(Opened, Period.Quarter)]),
        new TimeOrderTerm(TimeOrderOperation.Lag, Age, 1), new TimeOrderTerm(TimeOrderOperation.Change, Age, 2), new TimeOrderTerm(TimeOrderOperation.MovingAverage, Age, 2),
        new ProductTerm([new TimeOrderTerm(TimeOrderOperation.Lag, Age, 1), Region]),
    ];

    public static TheoryData<int> Indices => [.. Enumerable.Range(0, _terms.Length)];

    [Theory]
    [MemberData(nameof(Indices))]
    public void Values_do_not_depend_on_the_rows_asked_for_and_strides_hold(int index)
    {
        var term = Bind(_table, _terms[index]);
        int[] rows = [7, 0, 4, 4, 6];
        const int stride = 9;
        var all = term.Columns();
        var into = Enumerable.Repeat(-77.5, ((term.ColumnLabels.Count - 1) * stride) + rows.Length).ToArray();
        term.Fill(rows, into, stride);

        for (var at = 0; at < into.Length; at++)
        {
            var (column, row) = (at / stride, at % stride);
            Assert.Equal(row < rows.Length ? all[column][rows[row]] : -77.5, into[at]);
        }
    }

    [Theory]
    [MemberData(nameof(Indices))]
    public void A_row_with_its_sources_has_finite_values_or_is_undefined_and_a_row_without_throws_nothing(int index)
    {
        var term = Bind(_table, _terms[index]);
        var columns = term.Columns();
        var undefined = _terms[index] == _log ? new[] { 3, 5 } : _terms[index] is RatioTerm ? [3] : [];

        foreach (var row in AllRows(_table).Where(row => !term.Sources.Any(source => source.IsMissing(row))))
        {
            Assert.All(columns, column => Assert.Equal(!undefined.Contains(row), double.IsFinite(column[row])));
        }

        term.Fill([], [], 0);
    }

    /// <summary>No term makes a number of one that does not exist, although exp(log 0) = 0, 1 / log(0) = 0 and a cap of log(0) could be computed.</summary>
    [Fact]
    public void What_does_not_exist_stays_so_through_other_terms()
    {
        Term[] outer =
        [
            new TransformTerm(NumberTransform.Exp, _log), new TransformTerm(NumberTransform.Inverse, _log), new PowerTerm(_log, -1), new CapTerm(_log, -5, 5),
            new WinsoriseTerm(_log, 0.1, 0.9), new BinsTerm(_log, [1]), new SplineTerm(_log, [0, 1, 2]), new PolynomialTerm(_log, 2),
            new RatioTerm(Age, _log), new MinusTerm(Age, _log), new ProductTerm([_log, new IndicatorTerm(Region, "n")]),
        ];

        foreach (var term in outer)
        {
            Assert.All(Bind(_table, term).Columns([3, 5]).SelectMany(column => column), value => Assert.False(double.IsFinite(value)));
            Assert.All(Bind(_table, term).Columns([4, 6, 7]).SelectMany(column => column), value => Assert.True(double.IsFinite(value)));
        }
    }
}
