namespace Auditor.Numerics.GroupTests;

/// <summary>
/// How many independent, equally informative rows the data are worth for one group's question, by the covariance V of u that the verdict rests on:
/// n_eff = (df1 + df2 + 1) s² / lambda_max(V), s² the mean square of F + group. It equals df1 + df2 + 1 = n - rank F + 1 when V is classical, may exceed
/// n, and does not depend on the weights' scale.
/// </summary>
/// <param name="LeastInformed">n_eff: in the direction of the group that the data inform least; used for bounds and power.</param>
/// <param name="BestInformed">The same with lambda_min(V); used for the lower limit of the basis interval.</param>
/// <remarks>The project's own definition. Verified against tests/vectors/effective_rows.json (numpy).</remarks>
public sealed record EffectiveRows(double LeastInformed, double BestInformed)
{
    /// <summary>n - rank F + 1 in every direction: V = s² I.</summary>
    public static EffectiveRows Classical(double df1, double df2) => new(df1 + df2 + 1, df1 + df2 + 1);

    /// <param name="covariance">q x q covariance of u = Qz'y.</param>
    /// <param name="meanSquare">s² of F + group.</param>
    /// <param name="df1">q.</param>
    /// <param name="df2">n - rank(F + group), whatever the basis.</param>
    /// <returns>Null when the covariance has no positive finite eigenvalues.</returns>
    public static EffectiveRows? Of(double[,] covariance, double meanSquare, double df1, double df2)
    {
        var (least, greatest) = Quadratic.EigenvalueRange(covariance);
        var scale = (df1 + df2 + 1) * meanSquare;
        return least > 0 && double.IsFinite(scale / least) ? new EffectiveRows(scale / greatest, scale / least) : null;
    }
}
