using System.Text.Json;
using Auditor.Numerics.Distributions;
using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>Source of values: statsmodels 0.13.5 (values/make_serial_values.py), but for the simulated ones.</summary>
public sealed class UnitRootTests
{
    public static TheoryData<string> Cases => SerialValues.Names("unit_root");

    [Theory]
    [MemberData(nameof(Cases))]
    public void Statistic_and_lags_are_those_of_coint(string name)
    {
        var one = SerialValues.Case("unit_root", name);
        var part = Part(one);
        var columns = SerialValues.Columns(one);
        double[] time = [.. Enumerable.Range(1, columns[0].Length).Select(t => (double)t)];
        double[][] trends = [.. Enumerable.Range(1, (int)part - 1).Select(power => time.Select(t => Math.Pow(t, power)).ToArray())];
        var check = Statistic(UnitRootResidual.Of(
            SerialValues.InOrder(Fit([.. columns, .. trends], SerialValues.Numbers(one, "response"))), part, columns.Length));
        VectorFile.Near(one.GetProperty("t").GetDouble(), check.Statistic, 1e-8);
        Assert.Equal(one.GetProperty("lags").GetInt32(), check.Lags);
    }

    /// <summary>Source: 400,000 draws of unrelated walks a case (numpy). At these sizes p for large samples is too small by up to eight times.</summary>
    [Fact]
    public void P_is_that_of_simulated_walks_of_the_same_length() => Assert.All(SerialValues.List("simulated").EnumerateArray(), one =>
    {
        var draws = one.GetProperty("draws").GetDouble();
        Assert.All(SerialValues.Numbers(one, "t").Zip(SerialValues.Numbers(one, "p")), pair =>
        {
            var found = P(pair.First, one, one.GetProperty("observations").GetDouble());
            var allowed = (0.02 * pair.Second) + (pair.Second < 0.01 ? 0.05 * pair.Second : 0) + (5 * Math.Sqrt(pair.Second / draws));
            Assert.Equal(pair.Second, found, allowed);
        });
    });

    [Fact]
    public void Critical_values_are_those_of_MacKinnon_2010()
    {
        var compared = 0;
        Assert.All(SerialValues.List("critical_values").EnumerateArray(), one =>
        {
            var n = one.GetProperty("observations").GetDouble();
            var values = SerialValues.Numbers(one, "values");
            var found = CointegrationCriticalValues.Of(Part(one), one.GetProperty("series").GetInt32(), n);
            Assert.All(values.Zip(found), pair => VectorFile.Near(pair.First, pair.Second, 1e-12));
            var p = values.Select(value => P(value, one, n));
            Assert.All(p.Zip([0.01, 0.05, 0.10]), pair => VectorFile.Near(pair.Second, pair.First, 1e-10));
            compared++;
        });
        Assert.Equal(108, compared);
    }

    /// <summary>The published p functions hold for large n; how near the quadratic comes to them is what UnitRootResidual's comment says.</summary>
    [Fact]
    public void P_is_near_the_published_function_for_large_samples() => Assert.All(SerialValues.List("large_sample_p").EnumerateArray(), one =>
    {
        var expected = one.GetProperty("p").GetDouble();
        var found = P(one.GetProperty("t").GetDouble(), one, 1e12);
        if (expected is >= 1e-4 and <= 0.15)
        {
            Assert.InRange(found, expected * 0.93, expected * 1.07);
        }

        Assert.Equal(expected, found, expected <= 0.35 ? 0.004 : 0.04);
    });

    [Fact]
    public void Beyond_the_turn_p_is_only_a_bound()
    {
        var far = UnitRootResidual.P(-60, Deterministic.Constant, 2, 100);
        Assert.True(far.Bound);
        Assert.InRange(StandardNormal.UpperTail(-far.Z), 0, 1e-10);
        Assert.False(UnitRootResidual.P(-10, Deterministic.Constant, 2, 100).Bound);
    }

    [Fact]
    public void What_makes_the_test_void_is_said()
    {
        double[] y = [.. Enumerable.Range(0, 30).Select(t => Math.Sin(t * 1.3) + (0.3 * Math.Cos(t * t)))];
        var fit = SerialValues.InOrder(Fit([], y));
        Assert.IsType<CheckStatistic>(UnitRootResidual.Of(fit, Deterministic.Constant, 0));
        Assert.IsType<CheckStatistic>(UnitRootResidual.Of(fit, Deterministic.Constant, 11));
        Assert.Equal(CheckImpediment.NoCriticalValues, Why(UnitRootResidual.Of(fit, Deterministic.Constant, 12)));
        Assert.Equal(CheckImpediment.NoCriticalValues, Why(UnitRootResidual.Of(fit, Deterministic.None, 1)));
        Assert.Equal(CheckImpediment.TooFew, Why(UnitRootResidual.Of(SerialValues.InOrder(Fit([], y[..19])), Deterministic.Constant, 0)));
        var order = SerialOrder.Of(new int[30], [.. Enumerable.Range(0, 30).Select(t => (long)(t < 9 ? t : t + 1))])!;
        Assert.Equal(CheckImpediment.Gaps, Why(UnitRootResidual.Of(new SerialFit(Fit([], y), order, false), Deterministic.Constant, 0)));
    }

    private static double P(double t, JsonElement one, double n) =>
        StandardNormal.UpperTail(-UnitRootResidual.P(t, Part(one), one.GetProperty("series").GetInt32(), n).Z);

    private static Deterministic Part(JsonElement one) => one.GetProperty("trend").GetString() switch
    {
        "c" => Deterministic.Constant,
        "ct" => Deterministic.Trend,
        _ => Deterministic.QuadraticTrend,
    };
}
