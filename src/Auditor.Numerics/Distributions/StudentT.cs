namespace Auditor.Numerics.Distributions;

/// <summary>
/// Student's t distribution with real df above 0 (df = +inf: the standard normal), through T² = F(1, df).
/// </summary>
/// <remarks>
/// Verified to 1e-10 relative (on the logarithm where that is asked) against 80-digit values for df from 0.5 to 2e11 and |t| from 1e-3 to
/// 1e140; beyond |t| = 1e150, where t² would overflow, by the power law that the tail follows there (for df up to about 1e280).
/// </remarks>
public static class StudentT
{
    private const double FarOut = 1e150;

    /// <summary>P(|T| > |t|), the two-sided p-value, with full relative accuracy when small.</summary>
    public static double TwoSided(double t, double df) =>
        Math.Abs(t) > FarOut ? Math.Exp(LogTwoSided(t, df)) : FisherF.Survival(t * t, 1, df);

    /// <summary>Natural logarithm of P(|T| > |t|), finite also where that probability is below the smallest double.</summary>
    public static double LogTwoSided(double t, double df)
    {
        double size = Math.Abs(t);
        return size > FarOut
            ? FisherF.LogSurvival(FarOut * FarOut, 1, df) - (df * (Math.Log(size) - Math.Log(FarOut)))
            : FisherF.LogSurvival(t * t, 1, df);
    }

    /// <summary>t with P(T > t) = p: positive for p below 1/2, 0 at 1/2, -inf at 1 and +inf at 0. Verified for p from 1e-290 to 1/2.</summary>
    public static double UpperQuantile(double p, double df)
    {
        FisherF.CheckProbability(p);
        return p <= 0.5 ? Positive(2 * p, df) : -Positive(2 * (1 - p), df);
    }

    private static double Positive(double twoSided, double df)
    {
        double square = FisherF.UpperQuantile(twoSided, 1, df);
        return twoSided > 0 && square > FarOut * FarOut
            ? FarOut * Math.Exp((FisherF.LogSurvival(FarOut * FarOut, 1, df) - Math.Log(twoSided)) / df)
            : Math.Sqrt(square);
    }
}
