using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Elimination;

/// <summary>
/// A sum of squares as a quadratic form of the response's k coordinates t, held by its k x k upper triangle S: t'N t = |S t|². Held so, it is never
/// negative and keeps its digits where t'N t would cancel.
/// </summary>
internal sealed class SquareRoot
{
    private readonly double[] _rows;
    private readonly int _k;

    private SquareRoot(double[] rows, int k) => (_rows, _k) = (rows, k);

    /// <summary>The sum of squares of the given rows of the last k columns of a matrix.</summary>
    public static SquareRoot Of(ColumnMatrix matrix, int k, int firstRow, int rows)
    {
        var part = new ColumnMatrix(Math.Max(rows, 1), k);
        for (var c = 0; c < k && rows > 0; c++)
        {
            matrix.Column(matrix.Columns - k + c).Slice(firstRow, rows).CopyTo(part.Column(c));
        }

        for (var c = 0; c < Math.Min(k, part.Rows); c++)
        {
            Householder.Reflect(part, c, c, Later[(c + 1)..k]);
        }

        return new SquareRoot(RowByRow(part, k), k);
    }

    private static ReadOnlySpan<int> Later => [0, 1, 2, 3];

    public double At(ReadOnlySpan<double> t)
    {
        var (sum, at) = (0.0, 0);
        for (var row = 0; row < _k; row++)
        {
            var value = 0.0;
            for (var c = row; c < _k; c++)
            {
                value += _rows[at++] * t[c];
            }

            sum += value * value;
        }

        return sum;
    }

    private static double[] RowByRow(ColumnMatrix part, int k)
    {
        var rows = new double[k * (k + 1) / 2];
        var at = 0;
        for (var row = 0; row < k; row++)
        {
            for (var c = row; c < k; c++)
            {
                rows[at++] = row < part.Rows ? part[row, c] : 0;
            }
        }

        return rows;
    }
}
