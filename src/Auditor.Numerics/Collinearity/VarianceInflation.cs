using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Collinearity;

/// <summary>
/// Generalised variance inflation of one term of the final model with d kept columns X_j: det(X_j'M_0X_j) / det(X_j'M_-jX_j), M_0 the projection
/// off the intercept, M_-j off all other columns. For one column it is the usual factor; gvif^(1/(2 d)) compares terms of different d.
/// </summary>
/// <param name="Df">d, the term's kept columns.</param>
/// <remarks>
/// Fox and Monette 1992, JASA 87, who write it with determinants of correlation matrices; here as products of squared pivots, which keeps digits.
/// Verified against R's car (tests/reference).
/// </remarks>
public sealed record VarianceInflation(int Df, double Gvif)
{
    public double Scaled => Math.Pow(Gvif, 0.5 / Df);

    /// <param name="columns">Design columns of the term.</param>
    /// <returns>Null when all of them are aliased.</returns>
    public static VarianceInflation? Of(FinalFactor final, IReadOnlyList<int> columns)
    {
        var own = final.Kept.Where(columns.Contains).ToArray();
        if (own.Length == 0)
        {
            return null;
        }

        int[] intercept = final.Factor.Layout.Intercept ? [0] : [];
        var alone = LogPivots(final, intercept, own);
        var afterOthers = LogPivots(final, [.. intercept.Union(final.Kept.Except(own))], own);
        return new VarianceInflation(own.Length, Math.Exp(2 * (alone - afterOthers)));
    }

    private static double LogPivots(FinalFactor final, int[] before, int[] own)
    {
        int[] order = [.. before, .. own];
        var matrix = final.Factor.R.Select(order);
        var later = Enumerable.Range(0, order.Length).ToArray();
        for (var c = 0; c < order.Length; c++)
        {
            Householder.Reflect(matrix, c, c, later.AsSpan(c + 1));
        }

        return Enumerable.Range(before.Length, own.Length).Sum(c => Math.Log(Math.Abs(matrix[c, c])));
    }
}
