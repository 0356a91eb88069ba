namespace Auditor.Numerics.Distributions;

/// <summary>The chi-squared distribution with real df above 0, as df times F(df, +inf).</summary>
/// <remarks>
/// x in [0, +inf]. Verified to 1e-10 relative (on the logarithm where that is asked) against 80-digit values (series, and quadrature of the
/// density) for df from 0.5 to 1e6 and tails down to exp(-20000).
/// </remarks>
public static class ChiSquared
{
    /// <summary>P(X > x), with full relative accuracy in the tail.</summary>
    public static double Survival(double x, double df) => FisherF.Survival(x / df, df, double.PositiveInfinity);

    /// <summary>Natural logarithm of P(X > x), finite also where that probability is below the smallest double.</summary>
    public static double LogSurvival(double x, double df) => FisherF.LogSurvival(x / df, df, double.PositiveInfinity);
}
