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

        var (c, q) = (clusters.Contributing, group.Rank);
        if (q >= c)
        {
            return TestResult.None(Impediment.TooFewClusters);
        }

        var m = Quadratic.Products(q, clusters.Count, scores);
        return Quadratic.Form(group.U, m, Impediments.ScoreScale(group)) is double form
            ? ScoreF.FromLagrangeMultiplier(Phi(group, clusters) * form, c, q)
            : TestResult.None(Impediment.SingularCovariance);
    }
}
