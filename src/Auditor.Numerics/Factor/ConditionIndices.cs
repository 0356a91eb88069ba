using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.Factor;

/// <summary>Scaled condition indices of the final model: kept columns as declared, each at unit length, the intercept included.</summary>
/// <remarks>Belsley, Kuh and Welsch 1980, Regression Diagnostics. Verified against tests/reference.</remarks>
public static class ConditionIndices
{
    /// <summary>r indices, largest singular value over each, ascending.</summary>
    public static IReadOnlyList<double> Of(FinalFactor final)
    {
        if (final.Rank == 0)
        {
            return [];
        }

        var singular = ScaledTriangle(final).Svd(computeVectors: false).S;
        return [.. singular.Select(value => singular[0] / value)];
    }

    /// <summary>The r x r triangle of the columns as declared (the shifts put back), each column at unit length.</summary>
    internal static Matrix<double> ScaledTriangle(FinalFactor final)
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
