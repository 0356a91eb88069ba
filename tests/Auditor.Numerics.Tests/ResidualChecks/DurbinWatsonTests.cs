using System.Text.Json;
using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

public sealed class DurbinWatsonTests
{
    public static TheoryData<string> Cases => SerialValues.Names("durbin_watson");

    /// <summary>Source: values/make_serial_values.py, 60-digit integration over eigenvalues (2,000 rows: double precision, 1e-13 absolute).</summary>
    [Theory]
    [MemberData(nameof(Cases))]
    public void P_is_that_of_the_eigenvalues(string name)
    {
        var one = SerialValues.Case("durbin_watson", name);
        var check = Statistic(DurbinWatson.Of(SerialValues.Ordered(one)));
        VectorFile.Near(one.GetProperty("d").GetDouble(), check.Statistic, 1e-11);
        VectorFile.Near(one.GetProperty("p").GetDouble(), check.P, 1e-9);
        Assert.False(check.NormalApproximation);
        Assert.Equal(name.StartsWith("four units", StringComparison.Ordinal) ? 4 : null, check.WithinUnits);
    }

    /// <summary>
    /// The bounds of published tables (tests/reference/tables.json, 5 and 1 percent) are quantiles of d for columns that are eigenvectors of A: cosines for the lower
    /// bound. Residuals are made so that d is the bound.
    /// </summary>
    [Theory]
    [InlineData("lower_bound_5_percent", 0.05)]
    [InlineData("lower_bound_1_percent", 0.01)]
    [InlineData("upper_bound_5_percent", 0.05)]
    [InlineData("upper_bound_1_percent", 0.01)]
    public void Tabled_bounds_are_met_by_columns_that_are_cosines(string bound, double level)
    {
        var entries = Tables.GetProperty("durbin_watson_bounds").GetProperty("entries").EnumerateArray().ToList();
        Assert.True(entries.Count > 30);
        Assert.All(entries, entry =>
        {
            var (n, k) = (entry.GetProperty("n").GetInt32(), entry.GetProperty("regressors_without_intercept").GetInt32());
            var taken = bound[0] == 'l' ? Enumerable.Range(n - k, k) : Enumerable.Range(1, k);
            var left = Enumerable.Range(1, n - 1).Except(taken).ToArray();
            var check = Statistic(DurbinWatson.Of(SerialValues.InOrder(Fit(
                [.. taken.Select(j => Cosine(n, j))], WithRatio(n, left[0], left[^1], entry.GetProperty(bound).GetDouble())))));
            VectorFile.Near(level, check.P, 1e-6);
        });
    }

    [Fact]
    public void Above_2000_rows_p_is_normal_and_near_the_exact_one()
    {
        var generator = new Auditor.Numerics.Random.Generator(3);
        double[] x = [.. Enumerable.Range(0, 2001).Select(t => Math.Sin(t / 50.0))];
        double[] y = [.. x.Select(value => value + generator.Normal())];
        var normal = Statistic(DurbinWatson.Of(SerialValues.InOrder(Fit([x], y))));
        var exact = Statistic(DurbinWatson.Of(SerialValues.InOrder(Fit([x[..2000]], y[..2000]))));
        Assert.True(normal.NormalApproximation);
        Assert.False(exact.NormalApproximation);
        Assert.Equal(exact.P, normal.P, 0.02);
    }

    [Fact]
    public void A_lagged_response_leaves_no_law() => Assert.Equal(
        CheckImpediment.LaggedResponse, Why(DurbinWatson.Of(SerialValues.InOrder(Fit([], [1, 3, 2, 4, 9, 5]), laggedResponse: true))));

    /// <summary>With one residual direction d is the same whatever the errors.</summary>
    [Fact]
    public void One_degree_of_freedom_is_no_check() =>
        Assert.Equal(CheckImpediment.TooFew, Why(DurbinWatson.Of(SerialValues.InOrder(Fit([[1, 2, 4]], [1, 5, 2])))));

    [Fact]
    public void Rows_without_neighbours_are_no_check() => Assert.Equal(
        CheckImpediment.TooFew, Why(DurbinWatson.Of(new SerialFit(Fit([], [1, 3, 2, 4, 9, 5]), SerialOrder.Of(new int[6], [0, 2, 4, 6, 8, 10])!, false))));

    private static JsonElement Tables { get; } =
        JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "reference", "tables.json"))).RootElement;

    private static double[] Cosine(int n, int j) => [.. Enumerable.Range(0, n).Select(t => Math.Cos(Math.PI * j * (t + 0.5) / n))];

    /// <summary>A mixture of two eigenvectors, whose ratios e'Ae/e'e are 2 - 2 cos(pi j / n), with the ratio d between them.</summary>
    private static double[] WithRatio(int n, int slow, int fast, double d)
    {
        double Ratio(int j) => 2 - (2 * Math.Cos(Math.PI * j / n));
        var share = (d - Ratio(slow)) / (Ratio(fast) - Ratio(slow));
        return [.. Cosine(n, slow).Zip(Cosine(n, fast), (a, b) => (Math.Sqrt(1 - share) * a) + (Math.Sqrt(share) * b))];
    }
}
