namespace Auditor.Numerics.Factor;

/// <summary>How many decimal digits of the coefficients can be trusted.</summary>
internal static class Digits
{
    private const double DoublePrecision = 15.95;

    /// <summary>
    /// The refinement changed b_j by d_j because rounding errors of the size of the data's last bit had moved it by as much: about
    /// -log10(|d_j| / max(|b_j|, se_j)) digits are the data's. The least over all coefficients.
    /// </summary>
    public static double Of(RefinedCoefficients coefficients, IReadOnlyList<double>? standardErrors)
    {
        var least = DoublePrecision;
        for (var j = 0; j < coefficients.Values.Count; j++)
        {
            var scale = Math.Max(Math.Abs(coefficients.Values[j]), standardErrors?[j] ?? 0);
            var change = Math.Abs(coefficients.Steps[j]) / scale;
            least = double.IsFinite(change) ? Math.Min(least, -Math.Log10(Math.Max(change, 1e-16))) : least;
        }

        return Math.Clamp(least, 0, DoublePrecision);
    }
}
