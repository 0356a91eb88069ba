using Auditor.Numerics.Factor;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// The partial (extra sum of squares) F test. Null: all coefficients of the group's columns in F + group are zero.
/// F = [(RSS(F) - RSS(F+g)) / q] / [RSS(F+g) / (n - rank(F+g))] on (q, n - rank(F+g)), q the rank the group adds, n observations.
/// Exact under normal, independent errors of equal variance.
/// </summary>
/// <remarks>Verified against R's anova, 100-digit arithmetic and published values (tests/reference).</remarks>
public static class PartialF
{
    public static TestResult Of(AddedGroup group) => WithMeanSquareOf(group, group.RssWith, ResidualDf(group), group);

    /// <summary>
    /// The same numerator over the mean square of a larger model: RSS and residual degrees of freedom of F and all groups on the same rows.
    /// </summary>
    public static TestResult WithMeanSquareOf(AddedGroup group, AddedGroup largest) =>
        WithMeanSquareOf(group, largest.RssWith, ResidualDf(largest), largest);

    public static double ResidualDf(AddedGroup group) => group.Final.Factor.Totals.N - group.RankWith;

    private static TestResult WithMeanSquareOf(AddedGroup group, double rss, double df2, AddedGroup denominator)
    {
        if (Impediments.OfGroup(group) is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        if (df2 <= 0)
        {
            return TestResult.None(Impediment.NoResidualDegreesOfFreedom);
        }

        return PerfectFit.Is(denominator.Final, rss)
            ? new PerfectWithGroup(group.Rank, df2)
            : TestResult.F(group.SumOfSquares / group.Rank / (rss / df2), group.Rank, df2);
    }
}
