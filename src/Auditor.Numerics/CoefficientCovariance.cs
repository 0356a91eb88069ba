using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics;

/// <summary>
/// Robust covariances of the final model's own coefficients, R^-1 S R^-T with S = sum omega_i q_i q_i' (r x r), or over clusters or periods. Kept for reproducing
/// what an author printed: no verdict rests on it.
/// </summary>
/// <remarks>
/// White 1980, Econometrica 48; MacKinnon and White 1985, Journal of Econometrics 29. Verified against R's sandwich (tests/reference,
/// robust_standard_errors of every case).
/// </remarks>
public static class CoefficientCovariance
{
    /// <summary>Standard errors of the kept columns as declared, r of them; null where the estimator does not exist.</summary>
    public static IReadOnlyList<double>? StandardErrors(CoefficientScores scores, Heteroskedastic estimator)
    {
        if (Matrix(scores, estimator) is not { } s)
        {
            return null;
        }

        return Errors(scores.Final, s);
    }

    /// <summary>CR1 by cluster, C/(C - 1) (n - 1)/(n - r) sum_c s_c s_c', which goes with t on C - 1 degrees of freedom; null where it does not exist.</summary>
    /// <remarks>Liang and Zeger 1986, Biometrika 73. Verified against R's sandwich and published values (tests/reference/petersen_panel).</remarks>
    public static IReadOnlyList<double>? ClusteredErrors(CoefficientClassScores clusters)
    {
        var (n, c, r) = (clusters.Final.Factor.Totals.N, clusters.Count, clusters.Final.Rank);
        return c > 1 && n > r ? Errors(clusters.Final, Quadratic.Products(r, c, clusters.Score, c / (c - 1.0) * (n - 1) / (n - r))) : null;
    }

    /// <summary>Newey and West's by period, lag L: G_0 + sum_l (1 - l/(L + 1)) (G_l + G_l'), times n/(n - r) where it is adjusted; null where it does not exist.</summary>
    /// <remarks>Newey and West 1987, Econometrica 55. Verified against R's sandwich and published values (tests/reference/us_investment).</remarks>
    public static IReadOnlyList<double>? SerialErrors(CoefficientClassScores periods, int lag, bool adjusted)
    {
        var (n, r) = (periods.Final.Factor.Totals.N, periods.Final.Rank);
        return n > r ? Errors(periods.Final, Scaled(NeweyWest.Products(r, periods.Count, periods.Score, Math.Min(lag, periods.Count - 1)), adjusted ? n / (n - r) : 1)) : null;
    }

    /// <summary>Null: all coefficients but the intercept are zero. Wald F = u' S^-1 u / k on (k, n - r), k = r - i.</summary>
    public static TestResult OverallF(CoefficientScores scores, Heteroskedastic estimator)
    {
        var final = scores.Final;
        var intercepts = final.Factor.Layout.Intercept ? 1 : 0;
        var k = final.Rank - intercepts;
        if (k == 0 || Matrix(scores, estimator) is not { } s)
        {
            return TestResult.None(k == 0 ? Impediment.AddsNothing : Impediment.RestsOnOneRow);
        }

        var slopes = new double[k, k];
        for (var a = 0; a < k; a++)
        {
            for (var b = 0; b < k; b++)
            {
                slopes[a, b] = s[a + intercepts, b + intercepts];
            }
        }

        return Quadratic.Form(final.Explained(final.Factor.Layout.Response)[intercepts..].ToArray(), slopes) is double form
            ? TestResult.F(form / k, k, final.Factor.Totals.N - final.Rank)
            : TestResult.None(Impediment.SingularCovariance);
    }

    private static double[] Errors(FinalFactor final, double[,] s) => [.. Enumerable.Range(0, final.Rank).Select(k => Math.Sqrt(Form(Row(final, k), s)))];

    private static double[,]? Matrix(CoefficientScores scores, Heteroskedastic estimator)
    {
        var n = scores.Final.Factor.Totals.N;
        return estimator switch
        {
            Heteroskedastic.Hc0 => scores.Hc0,
            Heteroskedastic.Hc1 => n > scores.Final.Rank ? Scaled(scores.Hc0, n / (n - scores.Final.Rank)) : null,
            _ when scores.LeverageOne => null,
            Heteroskedastic.Hc2 => scores.Hc2,
            _ => scores.Hc3,
        };
    }

    /// <summary>
    /// What turns Q'e into the error of coefficient k: row k of R^-1. The declared constant is the shifted one minus the slopes times their shifts.
    /// </summary>
    private static double[] Row(FinalFactor final, int k)
    {
        var row = new double[final.Rank];
        row[k] = 1;
        if (k == 0 && final.Factor.Layout.Intercept)
        {
            for (var j = 1; j < row.Length; j++)
            {
                row[j] = -final.Factor.Shifts[final.Kept[j]];
            }
        }

        Triangle.SolveTransposed(final.Triangle, row);
        return row;
    }

    private static double Form(double[] g, double[,] s)
    {
        var total = 0.0;
        for (var a = 0; a < g.Length; a++)
        {
            for (var b = 0; b < g.Length; b++)
            {
                total += g[a] * s[a, b] * g[b];
            }
        }

        return Math.Max(0, total);
    }

    private static double[,] Scaled(double[,] s, double factor)
    {
        var scaled = (double[,])s.Clone();
        for (var i = 0; i < s.GetLength(0); i++)
        {
            for (var j = 0; j < s.GetLength(1); j++)
            {
                scaled[i, j] *= factor;
            }
        }

        return scaled;
    }
}
