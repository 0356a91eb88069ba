namespace Auditor.Numerics.Distributions;

/// <summary>The standard normal distribution, as Student's t with df = +inf.</summary>
/// <remarks>Verified to 1e-10 relative against 80-digit values (complementary error function) for z from -37.5 to 37.5, p from 1e-288 to 1 - 1e-8.</remarks>
public static class StandardNormal
{
    /// <summary>P(Z > z), with full relative accuracy in the upper tail.</summary>
    public static double UpperTail(double z)
    {
        double outside = StudentT.TwoSided(z, double.PositiveInfinity) / 2;
        return z > 0 ? outside : 1 - outside;
    }

    /// <summary>Natural logarithm of P(Z > z), z at least 0.</summary>
    public static double LogUpperTail(double z) => StudentT.LogTwoSided(z, double.PositiveInfinity) - Math.Log(2);

    /// <summary>z with P(Z &lt;= z) = p; -inf at 0, +inf at 1.</summary>
    public static double Quantile(double p) => -StudentT.UpperQuantile(p, double.PositiveInfinity);
}
