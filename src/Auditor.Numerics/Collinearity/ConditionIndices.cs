using Auditor.Numerics.Factor;
using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.Collinearity;

/// <summary>
/// Scaled condition indices of the final model and the proportions of each coefficient's variance that go with them: kept columns as declared, each
/// at unit length, the intercept included.
/// </summary>
/// <param name="Indices">r indices, largest singular value over each, ascending.</param>
/// <param name="Proportions">r x r: row for an index, column for a coefficient; each column sums to one.</param>
/// <remarks>Belsley, Kuh and Welsch 1980, Regression Diagnostics, chapter 3. Verified against tests/reference.</remarks>
public sealed record ConditionIndices(IReadOnlyList<double> Indices, double[,] Proportions)
{
    public static ConditionIndices Of(FinalFactor final)
    {
        if (final.Rank == 0)
        {
            return new ConditionIndices([], new double[0, 0]);
        }

        var svd = ScaledTriangle(final).Svd();
        var (singular, vt) = (svd.S, svd.VT);
        var shares = new double[final.Rank, final.Rank];
        for (var k = 0; k < final.Rank; k++)
        {
            var column = k;
            var parts = Enumerable.Range(0, final.Rank).Select(j => Math.Pow(vt[j, column] / singular[j], 2)).ToArray();
            for (var j = 0; j < final.Rank; j++)
            {
                shares[j, k] = parts[j] / parts.Sum();
            }
        }

        return new ConditionIndices([.. singular.Select(value => singular[0] / value)], shares);
    }

    /// <summary>The r x r triangle of the columns as declared (the shifts put back), each column at unit length.</summary>
    private static Matrix<double> ScaledTriangle(FinalFactor final)
    {
        var matrix = Matrix<double>.Build.Dense(final.Rank, final.Rank);
        for (var k = 0; k < final.Rank; k++)
        {
            var column = final.Triangle.Column(k).ToArray();
            column[0] += final.Factor.Shifts[final.Kept[k]] * final.Triangle[0, 0];
            matrix.SetColumn(k, column);
        }

        return matrix.NormalizeColumns(2);
    }
}
