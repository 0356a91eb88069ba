using System.Text.Json;
using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>
/// Checks of the residuals' distribution against R's stats package (values/make_values.R, whose file says which version): simulation with qr.resid, shapiro.test,
/// and Anderson–Darling's definition over pnorm's logarithms.
/// </summary>
public sealed class ShapeCheckTests
{
    private static readonly Lazy<JsonElement> Values = new(() => JsonDocument.Parse(File.ReadAllText(
        Path.Combine(AppContext.BaseDirectory, "ResidualChecks", "values", "values.json"))).RootElement);

    public static TheoryData<int> Simulated => Places("jarque_bera", 3);

    public static TheoryData<int> Samples => Places("shapiro_wilk", 10);

    public static TheoryData<int> Moved => Places("anderson_darling", 4);

    /// <summary>Two simulations of the same p: their difference against five standard deviations of it.</summary>
    [Theory]
    [MemberData(nameof(Simulated))]
    public void Jarque_Bera_simulates_the_residuals_of_the_model(int place)
    {
        var one = Values.Value.GetProperty("jarque_bera")[place];
        double[][] columns = [.. one.GetProperty("columns").EnumerateArray().Select(VectorFile.Doubles)];
        var check = Statistic(JarqueBera.Of(Fit(columns, VectorFile.Doubles(one.GetProperty("response"))), 1));
        VectorFile.Near(Number(one, "statistic"), check.Statistic, 1e-9);
        var p = Number(one, "p");
        var deviation = Math.Sqrt(p * (1 - p) * ((1 / Number(one, "draws")) + (1.0 / check.Draws!.Value)));
        Assert.InRange(check.SimulatedP!.Value, p - (5 * deviation), p + (5 * deviation));
    }

    [Fact]
    public void The_simulated_p_depends_on_nothing_but_the_seed()
    {
        var fit = Fit([], Exponential(60));
        var first = Statistic(JarqueBera.Of(fit, 1)).SimulatedP!.Value;
        Assert.Equal(first, Statistic(JarqueBera.Of(fit, 1)).SimulatedP);
        Assert.NotEqual(first, Statistic(JarqueBera.Of(Fit([], [.. Exponential(60).Select(Math.Sqrt)]), 2)).SimulatedP);
    }

    /// <summary>p is exact: over data with normal errors it is at most the level as often as the level says. 150 data sets; bounds at four standard deviations.</summary>
    [Fact]
    public void The_simulated_p_is_uniform_where_many_columns_make_chi_square_wrong()
    {
        var generator = new Auditor.Numerics.Random.Generator(20260101);
        double[][] columns = [.. Enumerable.Range(0, 12).Select(c => Enumerable.Range(0, 20).Select(_ => Math.Exp(2 * generator.Normal())).ToArray())];
        const int Sets = 150;
        var (decile, half) = (0, 0);
        for (var set = 0; set < Sets; set++)
        {
            var p = Statistic(JarqueBera.Of(Fit(columns, [.. Enumerable.Range(0, 20).Select(_ => generator.Normal())]), (ulong)set)).SimulatedP!.Value;
            decile += p <= 0.1 ? 1 : 0;
            half += p <= 0.5 ? 1 : 0;
        }

        Assert.InRange(decile, Within(0.1, Sets).Least, Within(0.1, Sets).Most);
        Assert.InRange(half, Within(0.5, Sets).Least, Within(0.5, Sets).Most);
    }

    [Theory]
    [InlineData(499, true)]
    [InlineData(500, false)]
    public void Jarque_Bera_is_simulated_below_500_rows(int rows, bool simulated)
    {
        var check = Statistic(JarqueBera.Of(Fit([], Exponential(rows)), 1));
        Assert.Equal(simulated, check.SimulatedP is not null);
        Assert.Equal(simulated, check.Draws is not null);
    }

    [Theory]
    [MemberData(nameof(Samples))]
    public void Shapiro_Wilk_is_that_of_R(int place)
    {
        var one = Values.Value.GetProperty("shapiro_wilk")[place];
        var check = Statistic(ShapiroWilk.Of(Fit([], Exponential(one.GetProperty("n").GetInt32()))));
        VectorFile.Near(Number(one, "w"), check.Statistic, 1e-11);
        VectorFile.Near(Number(one, "p"), check.P, 1e-8);
        if (one.GetProperty("sample") is { ValueKind: JsonValueKind.Array } sample)
        {
            var second = Statistic(ShapiroWilk.Of(Fit([], VectorFile.Doubles(sample))));
            VectorFile.Near(Number(one, "second_w"), second.Statistic, 1e-11);
            VectorFile.Near(Number(one, "second_p"), second.P, 1e-6);
        }
    }

    [Theory]
    [MemberData(nameof(Moved))]
    public void Anderson_Darling_is_its_definition(int place)
    {
        var one = Values.Value.GetProperty("anderson_darling")[place];
        var sample = Exponential(one.GetProperty("n").GetInt32());
        sample[^1] += Number(one, "moved");
        var check = Statistic(AndersonDarling.Of(Fit([], sample)));
        VectorFile.Near(Number(one, "a_squared"), check.Statistic, 1e-9);
        Assert.Equal(check.Statistic > 10, check.PIsUpperBound);
        Assert.True(!check.PIsUpperBound || check.P is > 1e-24 and < 1e-20);
    }

    /// <summary>-log(1 - u), u = (i - 0.5)/n: the sample of make_values.R.</summary>
    private static double[] Exponential(int n) => [.. Enumerable.Range(0, n).Select(i => -Math.Log(1 - ((i + 0.5) / n)))];

    private static double Number(JsonElement one, string name) => one.GetProperty(name).GetDouble();

    private static (int Least, int Most) Within(double share, int count)
    {
        var wide = 4 * Math.Sqrt(share * (1 - share) * count);
        return ((int)Math.Floor((share * count) - wide), (int)Math.Ceiling((share * count) + wide));
    }

    private static TheoryData<int> Places(string list, int count)
    {
        Assert.Equal(count, Values.Value.GetProperty(list).GetArrayLength());
        return [.. Enumerable.Range(0, count)];
    }
}
