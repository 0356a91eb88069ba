using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Parts;
using Auditor.Numerics.SecondPass;

namespace Auditor.Analysis.Parts;

/// <summary>The test that a group has the same effect in all parts, in the form that decides on the group as a whole, and the classical one beside it.</summary>
/// <param name="Basis">Name of the deciding form; null when there is no comparison.</param>
/// <param name="Compared">Parts that enter.</param>
internal sealed record DifferenceOfParts(string? Basis, TestResult Test, TestResult? Ceiling, TestResult Classical, int Compared)
{
    /// <summary>Its p ends above the level however large the difference.</summary>
    public bool CannotReject(double level) => Ceiling?.P > level;

    /// <param name="whole">The group on all its rows, which fixes the form; null: it has none.</param>
    /// <param name="parts">The group in each part; null where it has too few rows.</param>
    public static DifferenceOfParts Of(GroupEvidence? whole, int group, IReadOnlyList<GroupEvidence?> parts, PartFits fits, bool sampling)
    {
        var compared = parts.Index().Where(part => part.Item is { } evidence && evidence.Fit.Added.Rank > 0 && PartialF.ResidualDf(evidence.Fit.Added) > 0).ToList();
        if (whole is null || compared.Count < 2)
        {
            return None(Impediment.NothingToCompare, compared.Count);
        }

        if (EffectContrast.Of([.. compared.Select(part => part.Item!.Fit.Added)]) is not { } contrast)
        {
            return None(Impediment.TooManyDirections, compared.Count);
        }

        var forms = new FormsOfDifference(contrast, [.. compared.Select(part => (fits.Of(part.Index, group)!, part.Item!.Fit.Sums))], fits);
        var (name, test, ceiling) = forms.Deciding(whole.Basis);
        var classical = sampling ? TestResult.None(Impediment.SamplingWeights) : EqualEffectsF.Of(contrast);
        return new DifferenceOfParts(name, test, ceiling, classical, compared.Count);
    }

    private static DifferenceOfParts None(Impediment why, int compared) => new(null, TestResult.None(why), null, TestResult.None(why), compared);
}

/// <summary>The forms of one contrast.</summary>
/// <param name="parts">Fit and sums of each part that is compared.</param>
internal sealed class FormsOfDifference(EffectContrast contrast, IReadOnlyList<(RowSetFit Fit, GroupSums Sums)> parts, PartFits fits)
{
    /// <summary>The form of the basis on all rows; of two, as there, the one with the larger p, a form without a value leaving no other, and the higher ceiling.</summary>
    public (string Basis, TestResult Test, TestResult? Ceiling) Deciding(Basis basis)
    {
        if (basis.Over == SummedOver.Nothing)
        {
            return (basis.Name, basis.Name == Basis.Classical ? EqualEffectsF.Of(contrast) : EqualEffectsHc3.Of(contrast, [.. parts.Select(part => part.Sums)]), null);
        }

        var clusters = basis.Over & ~SummedOver.Period;
        var byCluster = clusters == SummedOver.Nothing ? default((string Basis, TestResult Test, TestResult? Ceiling)?) : OverClusters(clusters);
        var byPeriod = basis.Over.HasFlag(SummedOver.Period) ? OverPeriods() : default((string Basis, TestResult Test, TestResult? Ceiling)?);
        return byCluster is { } one && byPeriod is { } other ? Larger(one, other) : byCluster ?? byPeriod!.Value;
    }

    private static (string Basis, TestResult Test, TestResult? Ceiling) Larger(
        (string Basis, TestResult Test, TestResult? Ceiling) byCluster, (string Basis, TestResult Test, TestResult? Ceiling) byPeriod)
    {
        if (byPeriod.Test is NotComputable || byCluster.Test is NotComputable)
        {
            return byPeriod.Test is NotComputable ? byPeriod : byCluster;
        }

        return (byPeriod.Test.P >= byCluster.Test.P ? byPeriod : byCluster) with { Ceiling = byPeriod.Ceiling?.P >= byCluster.Ceiling?.P ? byPeriod.Ceiling : byCluster.Ceiling };
    }

    private (string Basis, TestResult Test, TestResult? Ceiling) OverClusters(SummedOver over)
    {
        var sums = Sums(over);
        return (Basis.Cluster, EqualEffectsOverClusters.Of(contrast, sums), EqualEffectsOverClusters.Ceiling(contrast, sums));
    }

    private (string Basis, TestResult Test, TestResult? Ceiling) OverPeriods()
    {
        var sums = Sums(SummedOver.Period);
        return (Basis.Time, EqualEffectsOverPeriods.Of(contrast, sums), EqualEffectsOverPeriods.Ceiling(contrast, sums));
    }

    private ContrastSums? Sums(SummedOver over)
    {
        if (contrast.Why() is not null)
        {
            return null;
        }

        int[][] inTable = [.. parts.Select(part => fits.Codes(part.Fit, over))];
        int[] all = [.. inTable.SelectMany(codes => codes).Distinct().Order()];
        return ContrastSums.Of(
            contrast,
            [.. parts.Select((part, k) => Of(part.Sums, over) is { } sums ? new PartClasses(sums, [.. inTable[k].Select(code => Array.BinarySearch(all, code))]) : null)],
            all.Length);
    }

    private static ClassSums? Of(GroupSums sums, SummedOver over) =>
        over == SummedOver.Cluster ? sums.Cluster : over == SummedOver.Unit ? sums.Unit : sums.Period;
}
