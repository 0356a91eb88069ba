using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Cluster-robust Wald test with the CR1 covariance. Null: all coefficients of the group's columns in F + group are zero. F = u' V^-1 u / q on
/// (q, C - 1), V = C/(C - 1) (n - 1)/(n - k) sum_c b_c b_c', b_c = sum over the cluster of qz_i e_i(F+g), k = rank(F+g), C clusters. Errors of different
/// clusters independent. Over-rejects unless clusters are many and alike.
/// </summary>
/// <remarks>Liang and Zeger 1986, Biometrika 73. Verified against R's sandwich (tests/reference/petersen_panel) and tests/vectors/score_forms.json.</remarks>
public static class Cr1
{
    public static TestResult Of(AddedGroup group, ClassSums clusters)
    {
        if (Impediments.OfRobust(group) is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        // The scores of all clusters add up to zero, so their products have rank C - 1 at most.
        if (group.Rank >= clusters.Count)
        {
            return TestResult.None(Impediment.TooFewClusters);
        }

        return Quadratic.Form(group.U, Covariance(group, clusters), Impediments.MeanSquare(group)) is double form
            ? TestResult.F(form / group.Rank, group.Rank, clusters.Count - 1)
            : TestResult.None(Impediment.SingularCovariance);
    }

    /// <summary>V of u, q x q; at least two clusters.</summary>
    public static double[,] Covariance(AddedGroup group, ClassSums clusters) =>
        Quadratic.Products(group.Rank, clusters.Count, clusters.ResidualScore, Factor(group, clusters));

    /// <summary>C/(C - 1) (n - 1)/(n - k).</summary>
    internal static double Factor(AddedGroup group, ClassSums clusters) =>
        clusters.Count / (clusters.Count - 1.0) * (group.Final.Factor.Totals.N - 1) / PartialF.ResidualDf(group);
}
