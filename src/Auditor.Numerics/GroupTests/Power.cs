using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Power of the F test of one group at stated effects, never at the observed one: P(F' > F_crit) with noncentrality f² n_eff.
/// </summary>
/// <remarks>Cohen 1988, Statistical Power Analysis, chapter 9. Verified against the power values of tests/reference.</remarks>
public static class Power
{
    private const double MostRows = 1e12;
    private const double MostPeriods = 1e9;

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

        return Least(rankFinal + df1, Enough);
    }

    /// <summary>
    /// The least number of clusters at which a partial R² equal to the bound is found with the wanted power by the CR2 form, if further clusters are like
    /// these: n_eff and eta keep their ratio to the number of clusters.
    /// </summary>
    /// <param name="eta">Degrees of freedom of the Wishart matrix with the clusters at hand.</param>
    /// <param name="clusters">Clusters at hand.</param>
    /// <returns>Null beyond a million million.</returns>
    public static double? ClustersNeeded(
        double df1, double eta, int clusters, double effectiveRows, double bound, double level, double power) =>
        Least(Math.Floor((df1 - 1) * clusters / eta), c => RatioPower(df1, (eta * c / clusters) - df1 + 1, effectiveRows * c / clusters, bound, level, power));

    /// <summary>The same in periods by the form over cosines: n_eff keeps its ratio to T, nu = floor(0.4 T^(2/3)) grows with it.</summary>
    /// <param name="periods">Observed periods at hand.</param>
    /// <returns>Null beyond a thousand million.</returns>
    public static double? PeriodsNeeded(double df1, int periods, double effectiveRows, double bound, double level, double power) =>
        Least(
            0,
            t => RatioPower(df1, Cosines.Number((int)t) - df1 + 1, effectiveRows * t / periods, bound, level, power),
            MostPeriods);

    private static bool RatioPower(double df1, double df2, double effectiveRows, double bound, double level, double power) =>
        df2 > 0 && AtBound(df1, df2, effectiveRows, bound, level) >= power;

    /// <summary>The least whole number above the first at which there is enough; null beyond the most.</summary>
    private static double? Least(double few, Func<double, bool> enough, double most = MostRows)
    {
        var many = few + 1;
        while (!enough(many))
        {
            (few, many) = (many, many * 2);
            if (many > most)
            {
                return null;
            }
        }

        while (many - few > 1)
        {
            var middle = Math.Floor((few + many) / 2);
            (few, many) = enough(middle) ? (few, middle) : (middle, many);
        }

        return many;
    }
}
