using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Cluster-robust Wald test with the CR2 covariance and approximate Hotelling degrees of freedom. Null: all coefficients of the group's columns in F + group
/// are zero. V = sum_c t_c t_c', t_c = Qz_c' (I - H_cc)^-1/2 e_c with e and H of F + group; F = (eta - q + 1)/(eta q) u'V^-1 u on (q, eta - q + 1), eta so that V
/// has the mean and the total variance of a Wishart matrix when errors are independent with equal variance (Satterthwaite for q = 1). Errors of different clusters
/// independent. Where I - H_cc is singular its generalised inverse is used; rows are times sqrt(w).
/// </summary>
/// <param name="Covariance">V of u, q x q; null when the test has no value.</param>
/// <param name="Eta">Degrees of freedom of the Wishart matrix; null likewise.</param>
/// <remarks>
/// Pustejovsky and Tipton 2018, Journal of Business and Economic Statistics 36. Verified against R's clubSandwich (values beside the tests) and
/// tests/vectors/score_forms.json.
/// </remarks>
public sealed record Cr2(TestResult Test, double[,]? Covariance = null, double? Eta = null)
{
    /// <summary>Operations that the degrees of freedom may cost.</summary>
    private const double MostWork = 1e9;

    /// <summary>An expected variance further than this below the true one has lost a direction to a cluster that fits it by itself.</summary>
    private const double Lost = 1e-6;

    /// <returns>Without a value when clusters are too many (<see cref="Impediment.TooManyClusters"/>): <see cref="Cr1"/> stands in then.</returns>
    public static Cr2 Of(AddedGroup group, ClassSums clusters)
    {
        if (Impediments.OfRobust(group) is Impediment impediment)
        {
            return None(impediment);
        }

        if (group.Rank >= clusters.Contributing)
        {
            return None(Impediment.TooFewClusters);
        }

        return clusters is { Moments: not null, Final: not null } && WishartDf.Work(group, clusters.Count) <= MostWork
            ? Estimate(group, clusters)
            : None(Impediment.TooManyClusters);
    }

    private static Cr2 None(Impediment why) => new(TestResult.None(why));

    private static Cr2 Estimate(AddedGroup group, ClassSums clusters)
    {
        var q = group.Rank;
        var (v, expected, df) = (new double[q, q], new double[q, q], new WishartDf(group, clusters.Count));
        foreach (var cluster in Enumerable.Range(0, clusters.Count).Select(code => new AdjustedCluster(group, clusters, code)))
        {
            Quadratic.AddProduct(v, cluster.Score, cluster.Score);
            df.Add(cluster);
            AddExpected(expected, cluster);
        }

        if (Quadratic.EigenvalueRange(expected).Least < 1 - Lost)
        {
            return None(Impediment.RestsOnOneCluster);
        }

        if (Quadratic.Form(group.U, v, Impediments.MeanSquare(group)) is not double wald)
        {
            return None(Impediment.SingularCovariance);
        }

        var eta = df.Eta();
        var df2 = eta - q + 1;
        return df2 > 0
            ? new Cr2(TestResult.F(df2 / (eta * q) * wald, q, df2), v, eta)
            : None(Impediment.TooFewClusters);
    }

    /// <summary>E(V) under independent errors of variance 1: sum_c (S_c - K_c'K_c), the identity unless a direction rests on one cluster.</summary>
    private static void AddExpected(double[,] expected, AdjustedCluster cluster)
    {
        for (var a = 0; a < expected.GetLength(0); a++)
        {
            for (var b = 0; b < expected.GetLength(1); b++)
            {
                expected[a, b] += cluster.Covariance[a, b];
            }
        }
    }
}
