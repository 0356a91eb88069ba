using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>Against 80-digit values: values/make_values.py.</summary>
public sealed class FisherFTests
{
    private static List<Dictionary<string, string>> Rows => ValueFile.Rows("fisher_f.csv", 750);

    [Fact]
    public void Survival_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "survival", r => FisherF.Survival(r.Number("f"), r.Number("df1"), r.Number("df2")));

    [Fact]
    public void Cumulative_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "cumulative", r => FisherF.Cumulative(r.Number("f"), r.Number("df1"), r.Number("df2")));

    [Fact]
    public void Log_survival_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "log_survival", r => FisherF.LogSurvival(r.Number("f"), r.Number("df1"), r.Number("df2")));

    [Fact]
    public void Upper_quantile_agrees_with_high_precision_inverses() =>
        ValueFile.AllClose(ValueFile.Rows("fisher_f_quantile.csv", 400), "f", r => FisherF.UpperQuantile(r.Number("p"), r.Number("df1"), r.Number("df2")));

    [Fact]
    public void Survival_of_the_quantile_is_the_probability()
    {
        foreach (Dictionary<string, string> row in ValueFile.Rows("fisher_f_quantile.csv", 400))
        {
            (double p, double df1, double df2) = (row.Number("p"), row.Number("df1"), row.Number("df2"));
            Assert.Equal(1, FisherF.Survival(FisherF.UpperQuantile(p, df1, df2), df1, df2) / p, 1e-10);
        }
    }

    [Fact]
    public void Log_survival_stays_finite_where_survival_underflows()
    {
        int deep = 0;
        foreach (Dictionary<string, string> row in Rows.Where(r => r.Number("log_survival") < -800))
        {
            deep++;
            (double f, double df1, double df2) = (row.Number("f"), row.Number("df1"), row.Number("df2"));
            Assert.Equal(0, FisherF.Survival(f, df1, df2));
            Assert.True(double.IsFinite(FisherF.LogSurvival(f, df1, df2)));
        }

        Assert.True(deep > 20);
    }

    [Fact]
    public void Ends_of_the_range()
    {
        Assert.Equal(1, FisherF.Survival(0, 3, 7));
        Assert.Equal(0, FisherF.Cumulative(0, 3, 7));
        Assert.Equal(0, FisherF.LogSurvival(0, 3, 7));
        Assert.Equal(0, FisherF.Survival(double.PositiveInfinity, 3, 7));
        Assert.Equal(1, FisherF.Cumulative(double.PositiveInfinity, 3, 7));
        Assert.Equal(double.NegativeInfinity, FisherF.LogSurvival(double.PositiveInfinity, 3, 7));
        Assert.Equal(double.PositiveInfinity, FisherF.UpperQuantile(0, 3, 7));
        Assert.Equal(0, FisherF.UpperQuantile(1, 3, 7));
        Assert.Equal(double.PositiveInfinity, FisherF.UpperQuantile(1e-300, 3, 0.5));
    }

    /// <summary>
    /// Far out the tail is C f^(-df2/2): its logarithm falls by df2/2 times the step in log f, whatever the size of the degrees of freedom.
    /// </summary>
    [Theory]
    [InlineData(1e200, 3, 7)]
    [InlineData(1e200, 2e3, 1e3)]
    [InlineData(1e200, 1e9, 1e9)]
    [InlineData(1e200, 1e9, 4e6)]
    public void Tail_far_out_is_a_power_of_f(double f, double df1, double df2)
    {
        double fall = FisherF.LogSurvival(f, df1, df2) - FisherF.LogSurvival(f * 1e100, df1, df2);
        Assert.Equal(1, fall / (df2 / 2 * Math.Log(1e100)), 1e-10);
    }

    [Theory]
    [InlineData(-1, 2, 3)]
    [InlineData(double.NaN, 2, 3)]
    [InlineData(1, 0, 3)]
    [InlineData(1, 2, double.NaN)]
    [InlineData(1, double.PositiveInfinity, double.PositiveInfinity)]
    public void Arguments_outside_the_range_are_a_bug_of_the_caller(double f, double df1, double df2) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => FisherF.Survival(f, df1, df2));

    [Theory]
    [InlineData(-0.1)]
    [InlineData(1.1)]
    [InlineData(double.NaN)]
    public void A_probability_outside_0_and_1_is_a_bug_of_the_caller(double p) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => FisherF.UpperQuantile(p, 2, 3));
}
