using System.Text.Json;
using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>Against 80-digit values (values/make_values.py), and six points made elsewhere at 40 digits (vectors/noncentral_f.json).</summary>
public sealed class NoncentralFTests
{
    private static List<Dictionary<string, string>> Rows => ValueFile.Rows("noncentral_f.csv", 500);

    private static List<Dictionary<string, string>> Inverses => ValueFile.Rows("noncentral_f_inverse.csv", 450);

    [Fact]
    public void Cumulative_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "cumulative", r => NoncentralF.Cumulative(r.Number("f"), r.Number("df1"), r.Number("df2"), r.Number("lambda")));

    [Fact]
    public void Survival_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "survival", r => NoncentralF.Survival(r.Number("f"), r.Number("df1"), r.Number("df2"), r.Number("lambda")));

    [Fact]
    public void Noncentrality_agrees_with_high_precision_inverses() =>
        ValueFile.AllClose(Inverses.Where(r => r["kind"] == "cumulative"), "lambda", r => NoncentralF.Noncentrality(r.Number("f"), r.Number("df1"), r.Number("df2"), r.Number("p")) ?? double.NaN);

    [Fact]
    public void Noncentrality_for_power_agrees_with_high_precision_inverses() =>
        ValueFile.AllClose(Inverses.Where(r => r["kind"] == "power"), "lambda", r => NoncentralF.NoncentralityForPower(r.Number("f"), r.Number("df1"), r.Number("df2"), r.Number("p")) ?? double.NaN);

    [Fact]
    public void Probability_at_the_inverse_is_the_one_asked_for()
    {
        foreach (Dictionary<string, string> row in Inverses)
        {
            (double f, double df1, double df2, double p) = (row.Number("f"), row.Number("df1"), row.Number("df2"), row.Number("p"));
            double back = row["kind"] == "power"
                ? NoncentralF.Survival(f, df1, df2, NoncentralF.NoncentralityForPower(f, df1, df2, p) ?? double.NaN)
                : NoncentralF.Cumulative(f, df1, df2, NoncentralF.Noncentrality(f, df1, df2, p) ?? double.NaN);
            Assert.Equal(1, back / p, 1e-10);
        }
    }

    [Fact]
    public void Cumulative_agrees_with_the_shared_vectors()
    {
        using JsonDocument file = JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "vectors", "noncentral_f.json")));
        JsonElement[] points = [.. file.RootElement.GetProperty("inputs").GetProperty("points").EnumerateArray()];
        JsonElement[] expected = [.. file.RootElement.GetProperty("outputs").GetProperty("cdf").EnumerateArray()];
        Assert.Equal(6, points.Length);
        foreach ((JsonElement point, JsonElement value) in points.Zip(expected))
        {
            double Get(string name) => point.GetProperty(name).GetDouble();
            Assert.Equal(1, NoncentralF.Cumulative(Get("x"), Get("df1"), Get("df2"), Get("lambda")) / value.GetDouble(), 1e-9);
        }
    }

    /// <summary>
    /// df1 = 1, df2 = +inf: F' is (Z + sqrt(lambda))², so its tails are normal ones, in closed form.
    /// </summary>
    [Theory]
    [InlineData(0.5, 0.3)]
    [InlineData(0.1, 40)]
    [InlineData(30, 400)]
    [InlineData(900, 1)]
    public void One_numerator_degree_over_infinitely_many_is_a_shifted_normal(double f, double lambda)
    {
        (double r, double shift) = (Math.Sqrt(f), Math.Sqrt(lambda));
        double outside = StandardNormal.UpperTail(r - shift) + StandardNormal.UpperTail(r + shift);
        Assert.Equal(1, NoncentralF.Survival(f, 1, double.PositiveInfinity, lambda) / outside, 1e-10);
        double inside = StandardNormal.UpperTail(shift - r) - StandardNormal.UpperTail(shift + r);
        Assert.Equal(1, NoncentralF.Cumulative(f, 1, double.PositiveInfinity, lambda) / inside, 1e-10);
    }

    /// <summary>
    /// An all but perfect fit has a huge F. The numerator is then as good as fixed at lambda/df1, so P(F' &lt;= f) = P(chi-squared(df2) >= df2 lambda/(df1 f)).
    /// </summary>
    [Theory]
    [InlineData(1e14, 0.05)]
    [InlineData(1e25, 0.95)]
    [InlineData(1e28, 0.025)]
    [InlineData(1e120, 0.05)]
    public void Noncentrality_of_a_huge_statistic_follows_from_the_denominator_alone(double f, double cumulative)
    {
        double lambda = NoncentralF.Noncentrality(f, 3, 17, cumulative) ?? double.NaN;
        Assert.Equal(1, ChiSquared.Survival(17 * (lambda / (3 * f)), 17) / cumulative, 1e-10);
    }

    [Fact]
    public void Limit_is_0_when_the_central_probability_is_already_small_enough()
    {
        double central = FisherF.Cumulative(0.3, 2, 50);
        Assert.Equal(0, NoncentralF.Noncentrality(0.3, 2, 50, central));
        Assert.Equal(0, NoncentralF.Noncentrality(0.3, 2, 50, 0.95));
        Assert.True(NoncentralF.Noncentrality(0.3, 2, 50, central * 0.999) > 0);
        Assert.Equal(0, NoncentralF.Noncentrality(3, 2, 50, 1));
        Assert.Equal(0, NoncentralF.NoncentralityForPower(3.1, 2, 50, 0.01));
    }

    [Fact]
    public void Unattainable_is_null()
    {
        Assert.Null(NoncentralF.Noncentrality(double.PositiveInfinity, 2, 50, 0.05));
        Assert.Null(NoncentralF.Noncentrality(3, 2, 50, 0));
        Assert.Null(NoncentralF.NoncentralityForPower(double.PositiveInfinity, 2, 50, 0.8));
        Assert.Null(NoncentralF.NoncentralityForPower(3, 2, 50, 1));
    }

    [Fact]
    public void Ends_of_the_range()
    {
        Assert.Equal(0, NoncentralF.Cumulative(0, 2, 50, 4));
        Assert.Equal(1, NoncentralF.Survival(0, 2, 50, 4));
        Assert.Equal(1, NoncentralF.Cumulative(double.PositiveInfinity, 2, 50, 4));
        Assert.Equal(0, NoncentralF.Survival(double.PositiveInfinity, 2, 50, 4));
        Assert.Equal(FisherF.Cumulative(1.7, 2, 50), NoncentralF.Cumulative(1.7, 2, 50, 0));
        Assert.Equal(FisherF.Survival(1.7, 2, 50), NoncentralF.Survival(1.7, 2, 50, 0));
    }

    [Theory]
    [InlineData(1e300, 1e9, 1e9, 1e-5)]
    [InlineData(1e100, 1e-3, double.PositiveInfinity, 1e-5)]
    [InlineData(1e300, 0.1, double.PositiveInfinity, 1e20)]
    [InlineData(1e-300, 0.5, 1e9, 1e300)]
    public void Far_corners_end_and_add_up_to_1(double f, double df1, double df2, double lambda) =>
        Assert.Equal(1, NoncentralF.Survival(f, df1, df2, lambda) + NoncentralF.Cumulative(f, df1, df2, lambda), 1e-11);

    [Theory]
    [InlineData(-1, 2, 1)]
    [InlineData(1, double.PositiveInfinity, 1)]
    [InlineData(1, 2, -1)]
    [InlineData(1, 2, double.NaN)]
    [InlineData(1, 2, double.PositiveInfinity)]
    public void Arguments_outside_the_range_are_a_bug_of_the_caller(double f, double df1, double lambda) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => NoncentralF.Survival(f, df1, 50, lambda));
}
