using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>Against 80-digit values: values/make_values.py.</summary>
public sealed class StudentTTests
{
    private static List<Dictionary<string, string>> Rows => ValueFile.Rows("student_t.csv", 300);

    [Fact]
    public void Two_sided_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "two_sided", r => StudentT.TwoSided(r.Number("t"), r.Number("df")));

    [Fact]
    public void Log_two_sided_agrees_with_high_precision_values() =>
        ValueFile.AllClose(Rows, "log_two_sided", r => StudentT.LogTwoSided(-r.Number("t"), r.Number("df")));

    [Fact]
    public void Upper_quantile_agrees_with_high_precision_inverses() =>
        ValueFile.AllClose(ValueFile.Rows("student_t_quantile.csv", 280), "t", r => StudentT.UpperQuantile(r.Number("p"), r.Number("df")));

    /// <summary>With one degree of freedom (Cauchy) P(|T| > t) = 2 atan(1/t)/pi and the upper quantile is 1/tan(pi p), in closed form.</summary>
    [Theory]
    [InlineData(1e155)]
    [InlineData(1e300)]
    public void Cauchy_tail_far_out(double t)
    {
        double expected = 2 / Math.PI / t;
        Assert.Equal(1, StudentT.TwoSided(t, 1) / expected, 1e-10);
        Assert.Equal(1, StudentT.LogTwoSided(t, 1) / Math.Log(expected), 1e-10);
        Assert.Equal(1, StudentT.UpperQuantile(expected / 2, 1) / t, 1e-10);
    }

    [Fact]
    public void Quantiles_are_antisymmetric()
    {
        Assert.Equal(0, StudentT.UpperQuantile(0.5, 7));
        Assert.Equal(-StudentT.UpperQuantile(0.25, 7), StudentT.UpperQuantile(0.75, 7));
        Assert.Equal(double.PositiveInfinity, StudentT.UpperQuantile(0, 7));
        Assert.Equal(double.NegativeInfinity, StudentT.UpperQuantile(1, 7));
    }
}
