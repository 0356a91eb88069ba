namespace Auditor.Numerics.Factor;

/// <summary>When a residual sum of squares is nothing but rounding.</summary>
/// <remarks>
/// The rounding of a fit grows with the largest piece it adds up: |y| and |b_j| |x_j|. The factor of 8 is common practice, no source.
/// </remarks>
public static class PerfectFit
{
    private const double UnitRoundoff = 1.1102230246251565e-16;

    public static bool Is(FinalFactor final, double rss)
    {
        var noise = Noise(final);
        return rss <= noise * noise;
    }

    /// <summary>Length below which a vector of residuals is rounding.</summary>
    internal static double Noise(FinalFactor final) => 8 * UnitRoundoff * Math.Sqrt(final.Factor.R.Columns) * final.LargestPiece;
}
