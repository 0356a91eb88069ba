using Auditor.Numerics.Factor;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// eta = q (q + 1) / sum_st Var(V_st) for V = sum_c t_c t_c' with normal t of covariances P_cd = (S_c if c = d) - K_c'K_d and E(V) = I. The sum of variances is
/// sum_cd [(tr P_cd)² + tr(P_cd P_cd)].
/// </summary>
/// <remarks>
/// Pustejovsky and Tipton 2018. The part without S is sum_ij (|M_ij|² + tr(M_ij M_ij)), M_ij = sum_c k_ci k_cj' over the columns of K (k x k): with many clusters no
/// pair of them need be looked at (C k² q² operations in place of C² k q² / 2). Both ways are held against each other in the tests.
/// </remarks>
internal sealed class WishartDf
{
    /// <summary>Doubles that the moments may take (64 MB).</summary>
    private const double MostMoments = 1L << 23;

    private readonly int _q;
    private readonly int _k;
    private readonly double[][]? _moments;
    private readonly List<ColumnMatrix> _clusters = [];
    private double _sum;

    public WishartDf(AddedGroup group, int clusters)
        : this(group, ByMoments(group, clusters))
    {
    }

    public WishartDf(AddedGroup group, bool byMoments)
    {
        (_q, _k) = (group.Rank, group.RankWith);
        _moments = byMoments ? [.. Enumerable.Range(1, _k * _q).Select(length => new double[length])] : null;
    }

    public static double Work(AddedGroup group, int clusters) => ByMoments(group, clusters)
        ? clusters * Square(group.RankWith * (double)group.Rank) / 2
        : Square(clusters) * group.RankWith * Square(group.Rank) / 2;

    public void Add(AdjustedCluster cluster)
    {
        _sum += Variances(cluster.Covariance) - Variances(Product(cluster.K, cluster.K));
        if (_moments is null)
        {
            AddPairs(cluster.K);
        }
        else
        {
            AddMoments(cluster.K.Values, _moments);
        }
    }

    public double Eta() => _q * (_q + 1) / (_sum + (_moments is null ? 0 : OfMoments(_moments)));

    private static bool ByMoments(AddedGroup group, int clusters) =>
        2 * group.RankWith < clusters && Square(group.RankWith * (double)group.Rank) <= MostMoments;

    private static double Square(double value) => value * value;

    private static void AddMoments(ReadOnlySpan<double> k, double[][] moments)
    {
        for (var i = 0; i < k.Length; i++)
        {
            BlockKernels.AddScaled(moments[i], k[i], k[..(i + 1)]);
        }
    }

    private static double[,] Product(ColumnMatrix left, ColumnMatrix right)
    {
        var product = new double[left.Columns, right.Columns];
        for (var a = 0; a < left.Columns; a++)
        {
            for (var b = 0; b < right.Columns; b++)
            {
                product[a, b] = BlockKernels.Dot(left.Column(a), right.Column(b));
            }
        }

        return product;
    }

    /// <summary>(tr P)² + tr(P P).</summary>
    private static double Variances(double[,] p)
    {
        var (trace, squares) = (0.0, 0.0);
        for (var a = 0; a < p.GetLength(0); a++)
        {
            trace += p[a, a];
            for (var b = 0; b < p.GetLength(0); b++)
            {
                squares += p[a, b] * p[b, a];
            }
        }

        return Square(trace) + squares;
    }

    private void AddPairs(ColumnMatrix k)
    {
        foreach (var earlier in _clusters)
        {
            _sum += 2 * Variances(Product(earlier, k));
        }

        _sum += Variances(Product(k, k));
        _clusters.Add(k);
    }

    private double OfMoments(double[][] moments)
    {
        double At(int i, int j) => i >= j ? moments[i][j] : moments[j][i];
        var sum = 0.0;
        for (var i = 0; i < moments.Length; i++)
        {
            for (var j = 0; j < moments.Length; j++)
            {
                // Entry (s, t) of block M_ab, and entry (t, s) of the same block.
                var (a, s, b, t) = (i / _k, i % _k, j / _k, j % _k);
                sum += At(i, j) * (At(i, j) + At((a * _k) + t, (b * _k) + s));
            }
        }

        return sum;
    }
}
