using Auditor.Numerics.ResidualChecks;

namespace Auditor.Numerics.Tests.ResidualChecks;

public sealed class NormalOrderStatisticTests
{
    /// <summary>Source: R 4.2, qnorm(qbeta(p, i, n + 1 - i)).</summary>
    [Theory]
    [InlineData(0.025, 1, 21, -3.03444750393641)]
    [InlineData(0.5, 1, 21, -1.84569541763756)]
    [InlineData(0.975, 21, 21, 3.0344475039364)]
    [InlineData(0.025, 11, 21, -0.530718769220401)]
    [InlineData(0.975, 40000, 50000, 0.85411272112752)]
    [InlineData(0.025, 50000, 50000, 3.7951575385748)]
    [InlineData(0.5, 2.5, 6, -0.40465847405601)]
    public void Quantiles_are_those_of_the_beta_law(double p, double i, double n, double z) =>
        Assert.Equal(z, NormalOrderStatistic.Quantile(p, i, n), 1e-10);

    /// <summary>Source: symmetry of the normal law about zero.</summary>
    [Theory]
    [InlineData(3, 10)]
    [InlineData(200, 1_000_000)]
    public void The_i_th_smallest_mirrors_the_i_th_largest(int i, int n) =>
        Assert.Equal(NormalOrderStatistic.Quantile(0.025, i, n), -NormalOrderStatistic.Quantile(0.975, n + 1 - i, n), 1e-9);
}
