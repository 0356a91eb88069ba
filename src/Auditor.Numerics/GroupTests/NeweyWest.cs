using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Newey–West Wald test. Null: all coefficients of the group's columns in F + group are zero. F = u'V^-1 u / q on (q, n - k), V = n/(n - k) [G_0 + sum_l
/// (1 - l/(L + 1)) (G_l + G_l')], G_l = sum_t b_t b_(t-l)', b_t the sum of qz_i e_i(F+g) over the rows of period t, k = rank(F+g). No prewhitening. With one row a
/// period this is the published form; with several, the same on the sums by period (after Driscoll and Kraay 1998). Periods follow each other by rank:
/// a gap in time is not seen. Over-rejects under strong dependence.
/// </summary>
/// <param name="Lag">L.</param>
/// <remarks>
/// Newey and West 1987, Econometrica 55; lag rule Newey and West 1994, Review of Economic Studies 61. Verified against R's sandwich (tests/reference,
/// adjust_true) and published values there.
/// </remarks>
public sealed record NeweyWest(TestResult Test, int Lag)
{
    /// <param name="lag">Null for the rule floor(4 (T/100)^(2/9)), T periods; never more than T - 1.</param>
    public static NeweyWest Of(AddedGroup group, ClassSums periods, int? lag = null)
    {
        var used = Math.Min(lag ?? Rule(periods.Count), periods.Count - 1);
        return new NeweyWest(Wald(group, periods, used), used);
    }

    /// <summary>floor(4 (T/100)^(2/9)), the largest L with 10^4 L^9 at most 4^9 T², in whole numbers.</summary>
    public static int Rule(int periods)
    {
        var bound = System.Numerics.BigInteger.Pow(4, 9) * periods * periods;
        var lag = 0;
        while (10_000 * System.Numerics.BigInteger.Pow(lag + 1, 9) <= bound)
        {
            lag++;
        }

        return lag;
    }

    private static TestResult Wald(AddedGroup group, ClassSums periods, int lag)
    {
        if (Impediments.OfRobust(group) is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        // The scores of all periods add up to zero.
        if (group.Rank >= periods.Count)
        {
            return TestResult.None(Impediment.TooFewPeriods);
        }

        var df2 = PartialF.ResidualDf(group);
        var v = Quadratic.Scaled(Products(group.Rank, periods.Count, periods.ResidualScore, lag), group.Final.Factor.Totals.N / df2);
        return Quadratic.Form(group.U, v, Impediments.MeanSquare(group)) is double form
            ? TestResult.F(form / group.Rank, group.Rank, df2)
            : TestResult.None(Impediment.SingularCovariance);
    }

    /// <summary>G_0 + sum_l (1 - l/(L + 1)) (G_l + G_l') of the sums b_t by period.</summary>
    internal static double[,] Products(int q, int periods, Quadratic.Vector sums, int lag)
    {
        var v = Quadratic.Products(q, periods, sums);
        for (var l = 1; l <= lag; l++)
        {
            var weight = 1 - (l / (lag + 1.0));
            for (var t = l; t < periods; t++)
            {
                Quadratic.AddProduct(v, sums(t), sums(t - l), weight);
                Quadratic.AddProduct(v, sums(t - l), sums(t), weight);
            }
        }

        return v;
    }
}
