namespace Auditor.Numerics.Parts;

/// <summary>
/// Classical test that a group has the same effect in all parts. Null: the coefficients of Z x part in F x part + Z x part are equal over the parts. F = (d'd/df1) / s² on
/// (df1, n - rank of the full model), s² the full model's mean square; exact when errors are normal, independent and of equal variance in all parts.
/// </summary>
/// <remarks>Chow 1960, Econometrica 28, for some of the coefficients. Verified against R's lm and anova (Parts/values of the tests).</remarks>
public static class EqualEffectsF
{
    public static TestResult Of(EffectContrast contrast) => contrast.Why() is Impediment impediment
        ? TestResult.None(impediment)
        : TestResult.F(contrast.SumOfSquares / contrast.Rank / (contrast.RssWith / contrast.ResidualDf), contrast.Rank, contrast.ResidualDf);
}
