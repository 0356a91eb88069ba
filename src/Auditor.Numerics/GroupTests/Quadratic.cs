using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.GroupTests;

/// <summary>Quadratic forms u' V^-1 u and eigenvalues of small covariance matrices.</summary>
public static class Quadratic
{
    /// <summary>A pivot below this share of its diagonal is rounding: the matrix is singular.</summary>
    private const double Singular = 1e-13;

    /// <summary>u' V^-1 u for a q x q symmetric V, null when V is singular or not positive definite.</summary>
    public static double? Form(IReadOnlyList<double> u, double[,] v)
    {
        var q = u.Count;
        var (l, z, total) = (new double[q, q], new double[q], 0.0);
        for (var i = 0; i < q; i++)
        {
            for (var j = 0; j < i; j++)
            {
                l[i, j] = (v[i, j] - Inner(l, i, j, j)) / l[j, j];
            }

            var pivot = v[i, i] - Inner(l, i, i, i);
            if (!(pivot > Singular * v[i, i]))
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
        var values = Matrix<double>.Build.DenseOfArray(v).Evd(Symmetricity.Symmetric).EigenValues;
        return (values.Min(value => value.Real), values.Max(value => value.Real));
    }

    private static double Inner(double[,] l, int i, int j, int length)
    {
        var sum = 0.0;
        for (var k = 0; k < length; k++)
        {
            sum += l[i, k] * l[j, k];
        }

        return sum;
    }
}
