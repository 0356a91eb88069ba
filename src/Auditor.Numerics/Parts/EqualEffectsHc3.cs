using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Parts;

/// <summary>
/// Wald test with the HC3 covariance that a group has the same effect in all parts. Null as in <see cref="EqualEffectsF"/>. F = d'V^-1 d / df1 on (df1, n - rank of the full
/// model), V = sum_k L_k' V_k L_k with V_k the HC3 covariance of u_k in part k: leverages and residuals of the full model are those of the part. Errors independent,
/// variances free, within parts and between them.
/// </summary>
/// <remarks>Verified against R's sandwich (Parts/values of the tests).</remarks>
public static class EqualEffectsHc3
{
    /// <param name="sums">Each part's sums.</param>
    public static TestResult Of(EffectContrast contrast, IReadOnlyList<GroupSums> sums)
    {
        if (contrast.Why() is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        if (sums.Any(part => part.RestsOn.Count > 0))
        {
            return TestResult.None(Impediment.RestsOnOneRow);
        }

        return Quadratic.Form(contrast.U, Covariance(contrast, sums), contrast.RssWith / contrast.ResidualDf) is double form
            ? TestResult.F(form / contrast.Rank, contrast.Rank, contrast.ResidualDf)
            : TestResult.None(Impediment.SingularCovariance);
    }

    private static double[,] Covariance(EffectContrast contrast, IReadOnlyList<GroupSums> sums)
    {
        var v = new double[contrast.Rank, contrast.Rank];
        for (var k = 0; k < sums.Count; k++)
        {
            AddPart(v, contrast, k, sums[k].Hc3);
        }

        return v;
    }

    /// <summary>V += L_k' V_k L_k.</summary>
    private static void AddPart(double[,] v, EffectContrast contrast, int part, double[,] own)
    {
        var q = contrast.Parts[part].Rank;
        for (var a = 0; a < q; a++)
        {
            var (left, right, unit) = (new double[contrast.Rank], new double[contrast.Rank], new double[q]);
            unit[a] = 1;
            contrast.Turn(part, unit, left);
            contrast.Turn(part, [.. Enumerable.Range(0, q).Select(b => own[a, b])], right);
            Quadratic.AddProduct(v, left, right);
        }
    }
}
