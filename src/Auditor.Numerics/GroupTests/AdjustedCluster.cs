using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;
using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// One cluster's part in CR2, from its k x k matrix G = Q_c'Q_c and b = Q_c'e_c alone (Q = [Q_F Qz], k = r + q): with g(t) = (1 - t)^-1/2, zero at t = 1,
/// Q_c' (I - Q_c Q_c')^-1/2 = g(G) Q_c', so that every product over the cluster's rows is one of g(G), G and b.
/// </summary>
internal sealed class AdjustedCluster
{
    /// <summary>Below this norm the power series of g is shorter work than the eigenvalues.</summary>
    private const double SeriesNorm = 0.3;

    private const double SeriesEnd = 1e-18;

    /// <summary>1 - t below this is rounding: the cluster fits that direction by itself.</summary>
    private const double One = 1e-10;

    private readonly int _k;
    private readonly ColumnMatrix _gram;

    public AdjustedCluster(AddedGroup group, ClassSums clusters, int code)
    {
        _k = group.RankWith;
        _gram = Gram(group, clusters, code);
        var adjusted = Adjusted(group.Rank);
        K = Times(adjusted);
        var b = Scores(group, clusters, code);
        Score = [.. Enumerable.Range(0, group.Rank).Select(a => BlockKernels.Dot(adjusted.Column(a), b))];
        Covariance = Subtract(Inner(adjusted, K), Inner(K, K));
    }

    /// <summary>t_c, q entries.</summary>
    public double[] Score { get; }

    /// <summary>K_c = Q_c' (I - H_cc)^-1/2 Qz_c, k x q.</summary>
    public ColumnMatrix K { get; }

    /// <summary>
    /// S_c - K_c'K_c, S_c = Qz_c' (I - H_cc)^-1 Qz_c, q x q: the covariance of t_c under independent errors of variance 1; that of t_c and t_d is -K_c'K_d.
    /// </summary>
    public double[,] Covariance { get; }

    private static ColumnMatrix Gram(AddedGroup group, ClassSums clusters, int code)
    {
        var (r, q) = (group.Final.Rank, group.Rank);
        var gram = new ColumnMatrix(r + q, r + q);
        for (var j = 0; j < r; j++)
        {
            clusters.Final!.Squares(code, j).CopyTo(gram.Column(j));
        }

        for (var a = 0; a < q; a++)
        {
            var cross = clusters.Moments!.Cross(code, a);
            cross.CopyTo(gram.Column(r + a));
            clusters.Moments.Squares(code, a).CopyTo(gram.Column(r + a)[r..]);
            for (var j = 0; j < r; j++)
            {
                gram[r + a, j] = cross[j];
            }
        }

        return gram;
    }

    /// <summary>b = Q_c'e_c with e = e(F) - Qz u.</summary>
    private static double[] Scores(AddedGroup group, ClassSums clusters, int code)
    {
        double[] b = [.. clusters.Final!.Scores(code), .. clusters.ResidualScore(code)];
        for (var a = 0; a < group.Rank; a++)
        {
            BlockKernels.AddScaled(b.AsSpan(0, group.Final.Rank), -group.U[a], clusters.Moments!.Cross(code, a));
        }

        return b;
    }

    private static double[,] Inner(ColumnMatrix left, ColumnMatrix right)
    {
        var inner = new double[left.Columns, right.Columns];
        for (var a = 0; a < left.Columns; a++)
        {
            for (var b = 0; b < right.Columns; b++)
            {
                inner[a, b] = BlockKernels.Dot(left.Column(a), right.Column(b));
            }
        }

        return inner;
    }

    private static double[,] Subtract(double[,] left, double[,] right)
    {
        var difference = (double[,])left.Clone();
        for (var a = 0; a < left.GetLength(0); a++)
        {
            for (var b = 0; b < left.GetLength(1); b++)
            {
                difference[a, b] -= right[a, b];
            }
        }

        return difference;
    }

    /// <summary>The last q columns of g(G), k x q.</summary>
    private ColumnMatrix Adjusted(int q)
    {
        var norm = Norm();
        return norm <= SeriesNorm ? BySeries(q, norm) : ByEigenvalues(q);
    }

    /// <summary>Frobenius norm, at least the largest eigenvalue.</summary>
    private double Norm() => Math.Sqrt(Enumerable.Range(0, _k).Sum(j => BlockKernels.Dot(_gram.Column(j), _gram.Column(j))));

    /// <summary>(1 - t)^-1/2 = sum of (1 · 3 … (2j - 1))/(2 · 4 … 2j) t^j.</summary>
    private ColumnMatrix BySeries(int q, double norm)
    {
        var term = new ColumnMatrix(_k, q);
        var sum = new ColumnMatrix(_k, q);
        for (var a = 0; a < q; a++)
        {
            term[_k - q + a, a] = 1;
            sum[_k - q + a, a] = 1;
        }

        var (size, factor) = (1.0, 1.0);
        for (var j = 1; (size *= norm) > SeriesEnd; j++)
        {
            term = Times(term);
            factor *= (j - 0.5) / j;
            for (var a = 0; a < q; a++)
            {
                BlockKernels.AddScaled(sum.Column(a), factor, term.Column(a));
            }
        }

        return sum;
    }

    private ColumnMatrix ByEigenvalues(int q)
    {
        var evd = Matrix<double>.Build.Dense(_k, _k, (i, j) => _gram[i, j]).Evd(Symmetricity.Symmetric);
        var adjusted = new ColumnMatrix(_k, q);
        for (var e = 0; e < _k; e++)
        {
            var left = 1 - evd.EigenValues[e].Real;
            var vector = evd.EigenVectors.Column(e).AsArray() ?? evd.EigenVectors.Column(e).ToArray();
            for (var a = 0; a < q && left > One; a++)
            {
                BlockKernels.AddScaled(adjusted.Column(a), vector[_k - q + a] / Math.Sqrt(left), vector);
            }
        }

        return adjusted;
    }

    /// <summary>G times a k x q matrix.</summary>
    private ColumnMatrix Times(ColumnMatrix matrix)
    {
        var product = new ColumnMatrix(_k, matrix.Columns);
        for (var a = 0; a < matrix.Columns; a++)
        {
            for (var j = 0; j < _k; j++)
            {
                product[j, a] = BlockKernels.Dot(_gram.Column(j), matrix.Column(a));
            }
        }

        return product;
    }
}
