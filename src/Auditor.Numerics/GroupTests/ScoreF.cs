using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Score test over rows with the null imposed. Null: Z_g' M_F E(y) = 0. LM = phi u' M^-1 u with M = sum e_i(F)² qz_i qz_i', F = (n - q)/q LM/(n - LM)
/// on (q, n - q), n the observations with a non-zero qz row. phi = 1 - tr(N)/q, N = sum h_i(F) qz_i qz_i', corrects for the columns of F.
/// Errors independent, variances free.
/// </summary>
/// <remarks>
/// The score form after Boos 1992, The American Statistician 46 (from memory); phi is the project's own correction. Verified against
/// tests/vectors/score_forms.json (numpy).
/// </remarks>
public static class ScoreF
{
    public static TestResult Of(AddedGroup group, GroupSums sums) => Form(group, sums, sums.Score);

    /// <summary>
    /// The test's ceiling: the same form with e(F) replaced by the group's own fitted part. However large the effect, p cannot fall much below its p.
    /// </summary>
    public static TestResult Ceiling(AddedGroup group, GroupSums sums) => Form(group, sums, sums.Ceiling);

    /// <summary>phi, the share of the score's variance that estimating F leaves.</summary>
    public static double Phi(AddedGroup group, GroupSums sums) => 1 - (sums.LeverageTrace / group.Rank);

    private static TestResult Form(AddedGroup group, GroupSums sums, double[,] m)
    {
        if (Impediments.OfRobust(group) is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        if (sums.RestsOn.Count > 0)
        {
            return TestResult.None(Impediment.RestsOnOneRow);
        }

        var (n, q) = (sums.ContributingN, group.Rank);
        if (q >= n)
        {
            return TestResult.None(Impediment.TooFewContributions);
        }

        return Quadratic.Form(group.U, m) is double form
            ? FromLagrangeMultiplier(Phi(group, sums) * form, n, q)
            : TestResult.None(Impediment.SingularCovariance);
    }

    /// <summary>LM of n rows or clusters is at most n, and n itself only when all pull alike: F has no finite value then.</summary>
    internal static TestResult FromLagrangeMultiplier(double lm, double n, double q) => lm < n * (1 - 1e-12)
        ? TestResult.F((n - q) / q * lm / (n - lm), q, n - q)
        : TestResult.None(Impediment.NotFinite);
}
