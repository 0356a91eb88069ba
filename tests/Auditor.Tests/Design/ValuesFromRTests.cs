using System.Text.Json;
using Auditor.Declaration;
using Auditor.Design;
using static Auditor.Tests.Design.Binding;

namespace Auditor.Tests.Design;

/// <summary>Source of every expected value here: R 4.2.2, script make_values.R beside the values.</summary>
public sealed class ValuesFromRTests
{
    private static readonly JsonElement _values = JsonDocument.Parse(
        File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Design", "values", "values.json"))).RootElement;

    private static readonly Auditor.Data.DataTable _prices = Table(Binding.Numbers("price", Read("price")));

    [Fact]
    public void Spline_columns_are_those_of_the_equation()
    {
        var columns = Spline().Columns();

        Assert.Equal(["age spline 1", "age spline 2", "age spline 3", "age spline 4"], Spline().ColumnLabels);
        foreach (var (expected, found) in Matrix("spline").Zip(columns, (a, b) => (a, b)))
        {
            Near(expected, found, 1e-12);
        }
    }

    /// <summary>With the constant they span what splines::ns spans: every basis column of R is a combination of ours, to rounding.</summary>
    [Fact]
    public void Spline_columns_span_the_space_of_natural_splines()
    {
        var ours = Spline().Columns().Prepend([.. Read("x").Select(_ => 1.0)]).ToArray();
        var theirs = Matrix("ns");

        Assert.Equal(ours.Length, theirs.Length);
        var basis = Orthonormal(ours);
        Assert.Equal(ours.Length, basis.Count);
        Assert.All(theirs, column => Assert.InRange(Rest(column, basis).Max(Math.Abs), 0, 1e-12));
    }

    [Fact]
    public void Winsorise_limits_are_quantiles_of_type_7()
    {
        var sorted = Read("price").Order().ToArray();
        Near(Read("quantile_type_7"), [.. Read("probabilities").Select(p => KeptValues.Quantile(sorted, p))], 1e-14);

        var limits = Read("quantile_type_7"); // the second is of 0.01, the last but two of 0.9
        var found = Bind(_prices, new WinsoriseTerm(Price, 0.01, 0.9)).Columns()[0];
        Near([.. Read("price").Select(x => Math.Min(Math.Max(x, limits[1]), limits[^3]))], found, 1e-14);
    }

    [Theory]
    [InlineData(NumberTransform.Log, 0.5, "log")]
    [InlineData(NumberTransform.Log10, 0, "log10")]
    [InlineData(NumberTransform.Exp, -100, "exp_less_100")]
    [InlineData(NumberTransform.Sqrt, 0, "sqrt")]
    [InlineData(NumberTransform.Center, 0, "center")]
    public void Transforms(NumberTransform transform, double plus, string expected) =>
        Near(Read(expected), Bind(_prices, new TransformTerm(transform, Price, plus)).Columns()[0], 1e-14);

    [Fact]
    public void Power_of_a_broken_exponent() => Near(Read("power_1.7"), Bind(_prices, new PowerTerm(Price, 1.7)).Columns()[0], 1e-14);

    [Fact]
    public void Log1p_keeps_the_digits_of_small_numbers() => Near(
        Read("log1p"), Bind(Table(Binding.Numbers("price", Read("small"))), new TransformTerm(NumberTransform.Log1p, Price)).Columns()[0], 1e-15, least: 0);

    private static BoundTerm Spline() => Bind(Table(Binding.Numbers("age", Read("x"))), new SplineTerm(Age, Read("knots")));

    private static double[] Read(string name) => Numbers(_values.GetProperty(name));

    private static double[][] Matrix(string name) => [.. _values.GetProperty(name).EnumerateArray().Select(Numbers)];

    private static double[] Numbers(JsonElement list) => [.. list.EnumerateArray().Select(item => item.GetDouble())];

    private static void Near(double[] expected, double[] found, double relative, double least = 1e-9)
    {
        Assert.Equal(expected.Length, found.Length);
        Assert.All(expected.Zip(found), pair => Assert.Equal(pair.First, pair.Second, relative * Math.Max(Math.Abs(pair.First), least)));
    }

    private static List<double[]> Orthonormal(double[][] columns)
    {
        List<double[]> basis = [];
        foreach (var column in columns)
        {
            var rest = Rest(Rest(column, basis), basis);
            var length = Math.Sqrt(rest.Sum(value => value * value));
            Assert.True(length > 1e-6);
            basis.Add([.. rest.Select(value => value / length)]);
        }

        return basis;
    }

    private static double[] Rest(double[] column, List<double[]> basis)
    {
        foreach (var direction in basis)
        {
            var along = column.Zip(direction, (a, b) => a * b).Sum();
            column = [.. column.Zip(direction, (a, b) => a - (along * b))];
        }

        return column;
    }
}
