using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Test that an effect is negligible. Null: the partial R² is at least D. p = P(F' &lt;= F) with F' noncentral F on the degrees of freedom of the
/// Wald form from V and noncentrality D / (1 - D) n_eff. A small p shows that the effect is below D.
/// </summary>
/// <remarks>
/// After Campbell and Lakens 2021, British Journal of Mathematical and Statistical Psychology 74, who treat the whole model. Never with a
/// null-imposed F. Verified against tests/vectors/effective_rows.json.
/// </remarks>
public static class NegligibleEffect
{
    public static double P(FTest wald, EffectiveRows rows, double bound) =>
        NoncentralF.Cumulative(wald.Statistic, wald.Df1, wald.Df2, Noncentrality(rows.LeastInformed, bound));

    /// <summary>D / (1 - D) n_eff.</summary>
    internal static double Noncentrality(double effectiveRows, double bound) => bound / (1 - bound) * effectiveRows;
}
