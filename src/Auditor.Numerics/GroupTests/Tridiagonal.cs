using Auditor.Numerics.Factor;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// The ends of a large symmetric matrix's spectrum: reflections make it tridiagonal from the last row on (each row is updated and multiplied in one go, so the
/// matrix passes through the cache once a step), bisection by sign counts finds the two eigenvalues.
/// </summary>
/// <remarks>Golub and Van Loan, Matrix Computations, 8.3.1 and 8.4.1 (from memory). Compared with known spectra and with MathNet.Numerics in the tests.</remarks>
internal sealed class Tridiagonal
{
    private readonly double[] _diagonal;

    /// <summary>Entry k stands between k - 1 and k.</summary>
    private readonly double[] _beside;

    private Tridiagonal(int size) => (_diagonal, _beside) = (new double[size], new double[size]);

    /// <summary>Of a symmetric matrix; only its lower triangle is read.</summary>
    public static Tridiagonal Of(double[,] matrix)
    {
        var size = matrix.GetLength(0);
        var rows = new double[size][];
        for (var i = 0; i < size; i++)
        {
            rows[i] = new double[i + 1];
            for (var j = 0; j <= i; j++)
            {
                rows[i][j] = matrix[i, j];
            }
        }

        var reduced = new Tridiagonal(size);
        reduced.Reduce(rows);
        return reduced;
    }

    /// <summary>Least and greatest eigenvalue.</summary>
    public (double Least, double Greatest) Range()
    {
        var reach = Enumerable.Range(0, _diagonal.Length)
            .Select(i => Math.Abs(_diagonal[i]) + Math.Abs(_beside[i]) + (i + 1 < _beside.Length ? Math.Abs(_beside[i + 1]) : 0)).Max();
        return (Bisect(-reach, reach, 1), Bisect(-reach, reach, _diagonal.Length));
    }

    private void Reduce(double[][] rows)
    {
        var (v, w) = (new double[rows.Length], new double[rows.Length]);
        for (var k = rows.Length - 1; k >= 0; k--)
        {
            // Row k has not yet been updated by the last reflection; its v and w have k + 1 entries.
            Update(rows[k], k, v, w);
            _diagonal[k] = rows[k][k];
            if (k > 0)
            {
                var next = rows[k].AsSpan(0, k).ToArray();
                var beta = Reflector(next, k);
                var product = new double[k];
                for (var i = 0; i < k; i++)
                {
                    Update(rows[i], i, v, w);
                    Multiply(rows[i], i, next, product);
                }

                BlockKernels.Scale(product, beta);
                BlockKernels.AddScaled(product, -0.5 * beta * BlockKernels.Dot(product, next), next);
                (v, w) = (next, product);
            }
        }
    }

    /// <summary>Turns a row into v of the reflection I - beta v v' that leaves its last entry only, which is kept.</summary>
    private double Reflector(double[] row, int k)
    {
        var length = Math.Sqrt(BlockKernels.Dot(row, row));
        if (length * length < Householder.Nothing)
        {
            _beside[k] = 0;
            Array.Clear(row);
            return 0;
        }

        var image = row[^1] > 0 ? -length : length;
        _beside[k] = image;
        row[^1] -= image;
        return -1 / (image * row[^1]); // v'v = -2 image v_last
    }

    /// <summary>Row i of A - v w' - w v'.</summary>
    private static void Update(double[] row, int i, double[] v, double[] w)
    {
        BlockKernels.AddScaled(row, -v[i], w.AsSpan(0, i + 1));
        BlockKernels.AddScaled(row, -w[i], v.AsSpan(0, i + 1));
    }

    /// <summary>Row i's share in A v, the row standing for the column above its diagonal too.</summary>
    private static void Multiply(double[] row, int i, double[] v, double[] product)
    {
        product[i] += BlockKernels.Dot(row, v.AsSpan(0, i + 1));
        BlockKernels.AddScaled(product.AsSpan(0, i), v[i], row.AsSpan(0, i));
    }

    /// <summary>The eigenvalue with the given place from below.</summary>
    private double Bisect(double low, double high, int place)
    {
        while (low + ((high - low) / 2) is var middle && middle > low && middle < high)
        {
            (low, high) = Below(middle) >= place ? (low, middle) : (middle, high);
        }

        return high;
    }

    /// <summary>How many eigenvalues are below x.</summary>
    private int Below(double x)
    {
        var (count, pivot) = (0, 1.0);
        for (var i = 0; i < _diagonal.Length; i++)
        {
            pivot = _diagonal[i] - x - (_beside[i] * _beside[i] / pivot);
            pivot = pivot == 0 ? -double.Epsilon * 1e16 : pivot;
            count += pivot < 0 ? 1 : 0;
        }

        return count;
    }
}
