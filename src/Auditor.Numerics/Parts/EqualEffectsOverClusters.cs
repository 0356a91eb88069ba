using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Parts;

/// <summary>
/// Score test over clusters, equal effects imposed. Null as in <see cref="EqualEffectsF"/>, without a claim on variances. LM = phi d'M^-1 d with M = sum_c s_c s_c', s_c the
/// sum over a cluster, in whatever parts its rows lie, of Q_d's rows times the residual of F x part + Z; F and degrees of freedom as in <see cref="ClusterF"/>. Errors of
/// different clusters independent, anything within.
/// </summary>
/// <remarks>As <see cref="ClusterF"/>. Verified against it with the columns of both models written out.</remarks>
public static class EqualEffectsOverClusters
{
    /// <param name="clusters">Null when their products were too many to be kept.</param>
    public static TestResult Of(EffectContrast contrast, ContrastSums? clusters) => Form(contrast, clusters, clusters is null ? null : clusters.Score);

    /// <summary>The form with the contrast's own fitted part in place of the residuals: p cannot fall much below its p, however different the effects.</summary>
    public static TestResult Ceiling(EffectContrast contrast, ContrastSums? clusters) => Form(contrast, clusters, clusters is null ? null : clusters.FittedScore);

    private static TestResult Form(EffectContrast contrast, ContrastSums? clusters, Quadratic.Vector? scores)
    {
        if (contrast.Why() is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        return clusters is null || scores is null
            ? TestResult.None(Impediment.TooManyClusters)
            : ClusterF.Form(contrast.U, clusters.Count, clusters.Contributing, scores, clusters.Phi, contrast.ScoreScale);
    }
}
