namespace Auditor.Numerics.Factor;

/// <summary>Solves with small upper triangles.</summary>
internal static class Triangle
{
    /// <summary>x with T x = b, T the leading k x k upper triangle of the matrix, k = b's length; b is replaced.</summary>
    public static void Solve(ColumnMatrix t, Span<double> b)
    {
        for (var j = b.Length - 1; j >= 0; j--)
        {
            b[j] /= t[j, j];
            BlockKernels.AddScaled(b[..j], -b[j], t.Column(j)[..j]);
        }
    }

    /// <summary>x with T'x = b; b is replaced.</summary>
    public static void SolveTransposed(ColumnMatrix t, Span<double> b)
    {
        for (var j = 0; j < b.Length; j++)
        {
            b[j] = (b[j] - BlockKernels.Dot(t.Column(j)[..j], b[..j])) / t[j, j];
        }
    }

    /// <summary>Squared lengths of the rows of T^-1, the diagonal of (T'T)^-1; k entries for a k x k triangle.</summary>
    public static double[] InverseRowSquares(ColumnMatrix t, int k)
    {
        var squares = new double[k];
        var column = new double[k];
        for (var j = 0; j < k; j++)
        {
            column.AsSpan().Clear();
            column[j] = 1;
            Solve(t, column.AsSpan(0, j + 1));
            BlockKernels.AddSquares(squares.AsSpan(0, j + 1), column.AsSpan(0, j + 1));
        }

        return squares;
    }
}
