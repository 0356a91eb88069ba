using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// The i-th smallest of n independent standard normal values. The i-th smallest of n independent uniform values follows Beta(i, n + 1 - i)
/// exactly; the normal quantile, being increasing, carries its quantiles over.
/// </summary>
/// <remarks>
/// David and Nagaraja 2003, Order Statistics, section 2.1 (cited from memory). The beta quantile is taken from that of F(2i, 2(n + 1 - i)). Verified against R's
/// qnorm(qbeta(p, i, n + 1 - i)).
/// </remarks>
public static class NormalOrderStatistic
{
    /// <summary>z that the order statistic stays below with probability p.</summary>
    /// <param name="i">1 to n; a row that stands for several may lie between two.</param>
    public static double Quantile(double p, double i, double n)
    {
        var after = n + 1 - i;
        var ratio = i * FisherF.UpperQuantile(1 - p, 2 * i, 2 * after) / after;
        return ratio <= 1
            ? StandardNormal.Quantile(ratio / (1 + ratio))
            : -StandardNormal.Quantile(1 / (1 + ratio));
    }
}
