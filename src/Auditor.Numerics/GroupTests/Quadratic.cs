using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.GroupTests;

/// <summary>Quadratic forms u' V^-1 u and eigenvalues of small covariance matrices.</summary>
public static class Quadratic
{
    /// <summary>A pivot below this share of its diagonal is rounding: the matrix is singular.</summary>
    private const double Singular = 1e-13;

    /// <summary>A variance below this share of the classical one is rounding.</summary>
    private const double Rounding = 1e-20;

    /// <summary>From this order on it pays to work on whole panels and to look for the two eigenvalues alone.</summary>
    private const int Large = 64;

    /// <summary>u' V^-1 u for a q x q symmetric V, null when V is singular or not positive definite.</summary>
    /// <param name="classical">The classical variance of each entry of u, by which a V that is nothing but rounding is told.</param>
    public static double? Form(IReadOnlyList<double> u, double[,] v, double classical = 0)
    {
        var q = u.Count;
        if (q >= Large)
        {
            return LargeQuadratic.Form(u, v, (pivot, diagonal) => IsRounding(pivot, diagonal, classical));
        }

        var (l, z, total) = (new double[q, q], new double[q], 0.0);
        for (var i = 0; i < q; i++)
        {
            for (var j = 0; j < i; j++)
            {
                l[i, j] = (v[i, j] - Inner(l, i, j, j)) / l[j, j];
            }

            var pivot = v[i, i] - Inner(l, i, i, i);
            if (IsRounding(pivot, v[i, i], classical))
            {
                return null;
            }

            l[i, i] = Math.Sqrt(pivot);
            z[i] = (u[i] - Enumerable.Range(0, i).Sum(k => l[i, k] * z[k])) / l[i, i];
            total += z[i] * z[i];
        }

        return double.IsFinite(total) ? total : null;
    }

    /// <summary>Least and greatest eigenvalue of a symmetric matrix.</summary>
    public static (double Least, double Greatest) EigenvalueRange(double[,] v)
    {
        if (v.GetLength(0) >= Large)
        {
            return Tridiagonal.Of(v).Range();
        }

        var values = Matrix<double>.Build.DenseOfArray(v).Evd(Symmetricity.Symmetric).EigenValues;
        return (values.Min(value => value.Real), values.Max(value => value.Real));
    }

    /// <summary>sum over c = 0 … count - 1 of factor v_c v_c'.</summary>
    internal static double[,] Products(int q, int count, Vector of, double factor = 1)
    {
        var sum = new double[q, q];
        for (var c = 0; c < count; c++)
        {
            var v = of(c);
            AddProduct(sum, v, v, factor);
        }

        return sum;
    }

    /// <summary>factor V, a copy.</summary>
    internal static double[,] Scaled(double[,] v, double factor)
    {
        var scaled = (double[,])v.Clone();
        for (var i = 0; i < v.GetLength(0); i++)
        {
            for (var j = 0; j < v.GetLength(1); j++)
            {
                scaled[i, j] *= factor;
            }
        }

        return scaled;
    }

    /// <summary>into += factor a b'.</summary>
    internal static void AddProduct(double[,] into, ReadOnlySpan<double> a, ReadOnlySpan<double> b, double factor = 1)
    {
        for (var i = 0; i < a.Length; i++)
        {
            for (var j = 0; j < b.Length; j++)
            {
                into[i, j] += factor * a[i] * b[j];
            }
        }
    }

    private static bool IsRounding(double pivot, double diagonal, double classical) =>
        !(pivot > Math.Max(Singular * diagonal, Rounding * classical));

    private static double Inner(double[,] l, int i, int j, int length)
    {
        var sum = 0.0;
        for (var k = 0; k < length; k++)
        {
            sum += l[i, k] * l[j, k];
        }

        return sum;
    }

    /// <summary>The vector that belongs to class c.</summary>
    internal delegate ReadOnlySpan<double> Vector(int c);
}
