using Auditor.Numerics.Factor;

namespace Auditor.Numerics.GroupTests;

/// <summary>What keeps any test of a group from being computed, asked in one order everywhere.</summary>
internal static class Impediments
{
    public static Impediment? OfGroup(AddedGroup group)
    {
        if (group.Rank == 0)
        {
            return Impediment.AddsNothing;
        }

        if (PerfectFit.Is(group.Final, group.RssWithout))
        {
            return Impediment.PerfectWithoutGroup;
        }

        return PartialF.ResidualDf(group) <= 0 ? Impediment.NoResidualDegreesOfFreedom : null;
    }

    /// <summary>Robust forms need residuals of F + group that are more than rounding.</summary>
    public static Impediment? OfRobust(AddedGroup group) =>
        OfGroup(group) ?? (PerfectFit.Is(group.Final, group.RssWith) ? Impediment.PerfectWithGroup : null);

    /// <summary>Mean square of F + group, the classical variance of each entry of u.</summary>
    public static double MeanSquare(AddedGroup group) => group.RssWith / PartialF.ResidualDf(group);

    /// <summary>The variance that a score matrix is measured by: of the residuals or of the group's own fitted part, whichever is less.</summary>
    public static double ScoreScale(AddedGroup group) => Math.Min(MeanSquare(group), group.SumOfSquares / group.Final.Factor.Totals.N);
}
