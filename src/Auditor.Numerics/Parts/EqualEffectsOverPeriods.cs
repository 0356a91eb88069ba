using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Parts;

/// <summary>
/// Score test over periods, equal effects imposed. Null as in <see cref="EqualEffectsF"/>, without a claim on variances. Sums by period over all parts of Q_d's rows times the
/// residual of F x part + Z, their long-run variance by cosines; F and degrees of freedom as in <see cref="PeriodF"/>. Errors may depend on each other within a period and
/// over time, across the parts too.
/// </summary>
/// <remarks>As <see cref="PeriodF"/>. Verified against it with the columns of both models written out.</remarks>
public static class EqualEffectsOverPeriods
{
    /// <param name="periods">In the order of time; null when their products were too many to be kept.</param>
    public static TestResult Of(EffectContrast contrast, ContrastSums? periods) => Form(contrast, periods, periods is null ? null : periods.Score);

    /// <summary>The form with the contrast's own fitted part in place of the residuals: p cannot fall much below its p, however different the effects.</summary>
    public static TestResult Ceiling(EffectContrast contrast, ContrastSums? periods) => Form(contrast, periods, periods is null ? null : periods.FittedScore);

    private static TestResult Form(EffectContrast contrast, ContrastSums? periods, Quadratic.Vector? scores)
    {
        if (contrast.Why() is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        if (periods is null || scores is null)
        {
            return TestResult.None(Impediment.TooManyPeriods);
        }

        return PeriodF.Why(contrast.Rank, periods.Count, periods.Contributing) is Impediment few
            ? TestResult.None(few)
            : PeriodF.Form(contrast.U, periods.Count, scores, periods.Phi, contrast.ScoreScale);
    }
}
