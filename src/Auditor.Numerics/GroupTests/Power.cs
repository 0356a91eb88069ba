using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Power of the F test of one group at stated effects, never at the observed one: P(F' > F_crit) with noncentrality f² n_eff.
/// </summary>
/// <remarks>Cohen 1988, Statistical Power Analysis, chapter 9. Verified against the power values of tests/reference.</remarks>
public static class Power
{
    private const double MostRows = 1e12;

    /// <summary>Probability of rejecting at the level when the partial R² equals the bound.</summary>
    public static double AtBound(double df1, double df2, double effectiveRows, double bound, double level) =>
        NoncentralF.Survival(
            FisherF.UpperQuantile(level, df1, df2), df1, df2, NegligibleEffect.Noncentrality(effectiveRows, bound));

    /// <summary>The f² that the test finds with the wanted power.</summary>
    public static double? SmallestDetectable(double df1, double df2, double effectiveRows, double level, double power) =>
        NoncentralF.NoncentralityForPower(FisherF.UpperQuantile(level, df1, df2), df1, df2, power) / effectiveRows;

    /// <summary>
    /// The least number of observations at which a partial R² equal to the bound is found with the wanted power, if further rows are as informative
    /// as these: n_eff keeps its ratio to n - rank F + 1.
    /// </summary>
    /// <param name="df1">q, the rank of the group.</param>
    /// <param name="rankFinal">rank F.</param>
    /// <param name="ratio">n_eff / (n - rank F + 1) of the data at hand.</param>
    /// <returns>Null beyond a million million rows.</returns>
    public static double? RowsNeeded(double df1, int rankFinal, double ratio, double bound, double level, double power)
    {
        bool Enough(double n) =>
            AtBound(df1, n - rankFinal - df1, (n - rankFinal + 1) * ratio, bound, level) >= power;

        var (few, many) = (rankFinal + df1, rankFinal + df1 + 1);
        while (!Enough(many))
        {
            (few, many) = (many, many * 2);
            if (many > MostRows)
            {
                return null;
            }
        }

        while (many - few > 1)
        {
            var middle = Math.Floor((few + many) / 2);
            (few, many) = Enough(middle) ? (few, middle) : (middle, many);
        }

        return many;
    }
}
