using Auditor.Data;
using Auditor.Declaration;
using static Auditor.Tests.Design.Binding;

namespace Auditor.Tests.Design;

/// <summary>Expected values by hand.</summary>
public sealed class NumberBindingTests
{
    private static readonly DataTable _table = Table(
        Numbers("age", 12, 24, 36, 60), Numbers("price", 4, 2, 0.5, 8), Levels("region", "n", "s", "n", "t"), Dates("opened", "2020-01-31", null, "2020-05-01", "2021-01-01"));

    [Fact]
    public void A_number_column_is_taken_as_it_is() => Assert.Equal([[12, 24, 36, 60]], Bind(_table, Age).Columns());

    [Theory]
    [InlineData(NumberTransform.Square, 1, new double[] { 25, 9, 2.25, 81 }, "(price + 1)^2")]
    [InlineData(NumberTransform.Square, 0, new[] { 16, 4, 0.25, 64 }, "price^2")]
    [InlineData(NumberTransform.Inverse, 0, new[] { 0.25, 0.5, 2, 0.125 }, "1 / price")]
    [InlineData(NumberTransform.Abs, -3, new[] { 1, 1, 2.5, 5 }, "abs(price - 3)")]
    [InlineData(NumberTransform.Center, 0, new[] { 0.375, -1.625, -3.125, 4.375 }, "center(price)")]
    public void Transforms_and_their_labels(NumberTransform transform, double plus, double[] expected, string label)
    {
        var term = Bind(_table, new TransformTerm(transform, Price, plus));

        Assert.Equal([label], term.ColumnLabels);
        Assert.Equal([expected], term.Columns());
    }

    [Fact]
    public void Terms_of_one_column_nest()
    {
        var term = Bind(_table, new TransformTerm(NumberTransform.Sqrt, new MinusTerm(Age, new RatioTerm(Age, new CapTerm(Price, 1, 4))), 8));

        // 12 - 12/4 + 8 = 17, 24 - 24/2 + 8 = 20, 36 - 36/1 + 8 = 8, 60 - 60/4 + 8 = 53
        Assert.Equal([[Math.Sqrt(17), Math.Sqrt(20), Math.Sqrt(8), Math.Sqrt(53)]], term.Columns());
        Assert.Equal(["age", "price"], term.Sources.Select(source => source.Name));
    }

    [Fact]
    public void Power_and_polynomial()
    {
        Assert.Equal([[64, 8, 0.125, 512]], Bind(_table, new PowerTerm(Price, 3)).Columns());
        Assert.Equal([[1 / 16.0, 0.25, 4, 1 / 64.0]], Bind(_table, new PowerTerm(Price, -2)).Columns());

        var polynomial = Bind(_table, new PolynomialTerm(Price, 3));
        Assert.Equal(["price", "price^2", "price^3"], polynomial.ColumnLabels);
        Assert.Equal([[4, 2, 0.5, 8], [16, 4, 0.25, 64], [64, 8, 0.125, 512]], polynomial.Columns());
        Assert.Equal(["age / price", "(age / price)^2"], Bind(_table, new PolynomialTerm(new RatioTerm(Age, Price), 2)).ColumnLabels);
    }

    [Fact]
    public void Bins_are_closed_on_the_right_and_the_lowest_is_the_reference()
    {
        var term = Bind(_table, new BinsTerm(Age, [12, 24, 48.5]));

        Assert.Equal(["age in (12, 24]", "age in (24, 48.5]", "age over 48.5"], term.ColumnLabels);
        Assert.Equal([[0, 1, 0, 0], [0, 0, 1, 0], [0, 0, 0, 1]], term.Columns());
    }

    [Fact]
    public void A_spline_is_linear_beyond_its_outer_knots()
    {
        var term = Bind(Table(Numbers("age", -10, 0, 1, 60, 70, 80)), new SplineTerm(Age, [1, 20, 40, 60]));
        var columns = term.Columns();

        Assert.Equal([-10, 0, 1, 60, 70, 80], columns[0]);
        Assert.All(columns[1..], column =>
        {
            Assert.Equal([0, 0, 0], column[..3]);
            Assert.Equal(column[4] - column[3], column[5] - column[4], 1e-12);
            Assert.True(column[5] > column[4]);
        });
    }

    [Fact]
    public void Center_and_winsorise_look_at_the_kept_rows_that_have_a_value()
    {
        var table = Table(Numbers("price", 100, 0, Math.E, Math.Exp(3), double.NaN));
        var log = new TransformTerm(NumberTransform.Log, Price);
        int[] kept = [1, 2, 3, 4];

        // Of the kept rows one is undefined (log 0) and one missing: the mean of 1 and 3 is 2.
        Assert.Equal(2, Bind(table, new TransformTerm(NumberTransform.Center, log), kept).Columns([2, 3]) is [[var a, var b]] ? b - a : 0, 1e-14);
        Assert.Equal([-1, 1], Rounded(Bind(table, new TransformTerm(NumberTransform.Center, log), kept).Columns([2, 3])[0]));
        Assert.Equal([1.5, 2.5, 2.5], Rounded(Bind(table, new WinsoriseTerm(log, 0.25, 0.75), kept).Columns([2, 3, 0])[0]));
        Assert.Equal(
            ["model.yaml: center(log(price)): no kept row has a value of log(price)"],
            [.. Binder(table, [1, 4]).Bind(new TransformTerm(NumberTransform.Center, log)).Problems.Select(problem => problem.ToString())]);
    }

    /// <summary>The mean of 1e16, 1 and -1e16 is 1/3; summed without compensation it comes out as 0 (by hand).</summary>
    [Fact]
    public void The_mean_is_summed_with_compensation() =>
        Assert.Equal(1 - (1 / 3.0), Bind(Table(Numbers("price", 1e16, 1, -1e16)), new TransformTerm(NumberTransform.Center, Price)).Columns()[0][1]);

    [Fact]
    public void A_product_multiplies_each_with_each_and_the_last_factor_varies_fastest()
    {
        var term = Bind(_table, new ProductTerm([new PolynomialTerm(Price, 2), Region, Age]));

        Assert.Equal(["price * region = s * age", "price * region = t * age", "price^2 * region = s * age", "price^2 * region = t * age"], term.ColumnLabels);
        Assert.Equal([[0, 48, 0, 0], [0, 0, 0, 480], [0, 96, 0, 0], [0, 0, 0, 3840]], term.Columns());
        Assert.Equal(["price", "region", "age"], term.Sources.Select(source => source.Name));
    }

    [Fact]
    public void A_product_of_single_columns_can_be_part_of_another_term() =>
        Assert.Equal([[48, 48, 18, 480]], Bind(_table, new TransformTerm(NumberTransform.Abs, new ProductTerm([Age, Price]))).Columns());

    [Fact]
    public void What_is_no_number_is_refused_at_the_term_s_line()
    {
        Assert.Equal(["model.yaml:9: log(region): region holds levels, expected a number"], Refused(_table, new TransformTerm(NumberTransform.Log, Region) { Line = 9 }));
        Assert.Equal(["model.yaml: age / region: region holds levels, expected a number"], Refused(_table, new RatioTerm(Age, Region)));
        Assert.Equal(["model.yaml: exp(month(opened)): month(opened) makes several columns, expected a number"], Refused(_table, new TransformTerm(NumberTransform.Exp, new SeasonTerm(Opened, Period.Month))));
        Assert.Equal(["model.yaml: abs(age * region): region holds levels, expected a number"], Refused(_table, new TransformTerm(NumberTransform.Abs, new ProductTerm([Age, Region]))));
        Assert.Equal(
            ["model.yaml: log(region): region holds levels, expected a number", "model.yaml: opened holds dates and is no number: use step, pulse, season or trend of it"],
            Refused(_table, new ProductTerm([new TransformTerm(NumberTransform.Log, Region), Opened])));
    }

    private static double[] Rounded(double[] values) => [.. values.Select(value => Math.Round(value, 12))];
}
