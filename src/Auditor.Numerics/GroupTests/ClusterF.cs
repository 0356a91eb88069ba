using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Score test over clusters with the null imposed. Null: Z_g' M_F E(y) = 0. LM = phi u' M^-1 u with M = sum_c s_c s_c', s_c = sum over the cluster of
/// qz_i e_i(F); F = (C - q)/q LM/(C - LM) on (q, C - q), C the clusters with a non-zero qz row. phi = 1 - sum_c |Qz_c' Q_Fc|²/q. Errors of different
/// clusters independent, anything within.
/// </summary>
/// <remarks>
/// Generalised score after Boos 1992, The American Statistician 46 (from memory); phi is the project's own correction. Verified against
/// tests/vectors/score_forms.json (numpy).
/// </remarks>
public static class ClusterF
{
    public static TestResult Of(AddedGroup group, ClassSums clusters) => Form(group, clusters, clusters.Score);

    /// <summary>
    /// The test's ceiling: the same form with e(F) replaced by the group's own fitted part. However large the effect, p cannot fall much below its p.
    /// </summary>
    public static TestResult Ceiling(AddedGroup group, ClassSums clusters) => Form(group, clusters, clusters.FittedScore);

    /// <summary>phi, the share of the score's variance that estimating F leaves.</summary>
    public static double Phi(AddedGroup group, ClassSums classes) => 1 - (classes.LeverageTrace / group.Rank);

    private static TestResult Form(AddedGroup group, ClassSums clusters, Quadratic.Vector scores)
    {
        if (Impediments.OfRobust(group) is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        return Form(group.U, clusters.Count, clusters.Contributing, scores, Phi(group, clusters), Impediments.ScoreScale(group));
    }

    /// <param name="u">q entries: the sum of all scores of y.</param>
    /// <param name="count">Clusters.</param>
    /// <param name="contributing">Clusters with a non-zero row.</param>
    /// <param name="scores">s_c of each cluster, q entries.</param>
    /// <param name="scale">The variance of an entry of u that a covariance is measured by.</param>
    internal static TestResult Form(IReadOnlyList<double> u, int count, int contributing, Quadratic.Vector scores, double phi, double scale)
    {
        var (c, q) = (contributing, u.Count);
        if (q >= c)
        {
            return TestResult.None(Impediment.TooFewClusters);
        }

        return Quadratic.Form(u, Quadratic.Products(q, count, scores), scale) is double form
            ? ScoreF.FromLagrangeMultiplier(phi * form, c, q)
            : TestResult.None(Impediment.SingularCovariance);
    }
}
