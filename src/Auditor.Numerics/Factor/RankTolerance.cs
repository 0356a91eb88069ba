namespace Auditor.Numerics.Factor;

/// <summary>
/// When a column counts as a combination of earlier ones: its part orthogonal to them against its own (centred) length. Below
/// <see cref="Aliased"/> it adds nothing; below <see cref="Nearly"/> it adds a direction but costs digits. The method's own
/// limits (no source).
/// </summary>
public static class RankTolerance
{
    public const double Aliased = 1e-11;

    public const double Nearly = 1e-7;

    private const double UnitRoundoff = 1.1102230246251565e-16;

    internal static bool IsAliased(OrthogonalFactor factor, int column, double orthogonal)
    {
        var noise = 2 * UnitRoundoff * factor.LargestValues[column] * Math.Sqrt(factor.Totals.SumOfWeights);
        return orthogonal <= Math.Max(Aliased * factor.Lengths[column], noise);
    }

    /// <summary>Decimal digits lost when the orthogonal part is small, null when it is not.</summary>
    internal static double? DigitsLost(OrthogonalFactor factor, int column, double orthogonal)
    {
        var ratio = orthogonal / factor.Lengths[column];
        return ratio < Nearly ? -Math.Log10(ratio) : null;
    }
}
