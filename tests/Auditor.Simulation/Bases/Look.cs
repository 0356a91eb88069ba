using Auditor.Numerics;
using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Simulation.Bases;

/// <summary>The tests of one left-out group on one data set, each computed when it is asked for.</summary>
internal sealed class Look(AddedGroup group, GroupSums sums)
{
    private readonly Lazy<TestResult> _hc3 = new(() => WaldF.Of(group, sums, Heteroskedastic.Hc3));
    private readonly Lazy<Cr2?> _cr2 = new(() => sums.Cluster is { } clusters ? Numerics.GroupTests.Cr2.Of(group, clusters) : null);
    private readonly Lazy<PeriodWald?> _periodWald = new(() => sums.Period is { } periods ? Numerics.GroupTests.PeriodWald.Of(group, periods) : null);
    private readonly Lazy<LevelOfVariation?> _level = new(() => LevelOfVariation.Of(group, sums));

    public TestResult Classical => PartialF.Of(group);

    public TestResult Hc3 => _hc3.Value;

    public TestResult Score => ScoreF.Of(group, sums);

    public TestResult Cluster => ClusterF.Of(group, sums.Cluster!);

    public TestResult Cr1 => Numerics.GroupTests.Cr1.Of(group, sums.Cluster!);

    public TestResult Cr2 => _cr2.Value!.Test;

    /// <summary>CR1 with periods as clusters.</summary>
    public TestResult Cr1ByPeriod => Numerics.GroupTests.Cr1.Of(group, sums.Period!);

    public TestResult Period => PeriodF.Of(group, sums.Period!);

    public TestResult PeriodWald => _periodWald.Value!.Test;

    public TestResult NeweyWest => Numerics.GroupTests.NeweyWest.Of(group, sums.Period!).Test;

    public TestResult Basis => Declared.Test;

    /// <summary>The larger p of the forms by cluster and by period; none when one has none.</summary>
    public TestResult LargerOfBoth => Cluster is var c && Period is var t && (c.P is null || (t.P is not null && c.P >= t.P)) ? c : t;

    /// <summary>No test of the verdict's kind: any column's classical t in F + group beyond ±1.96.</summary>
    public bool AnyT => group.Kept.Any(column => LastIn(column) is FTest { Statistic: > 1.96 * 1.96 });

    /// <summary>The form on which the verdict rests by what is declared and by the level on which the group varies.</summary>
    private (TestResult Test, bool ByCluster, bool ByPeriod) Declared => _level.Value switch
    {
        null => (Hc3, false, false),
        { Level: VariationLevel.Rows } => sums.Cluster is null ? (Period, false, true) : (Cluster, true, false),
        { Level: VariationLevel.Period, Test: { } test } => (test, false, true),
        { Level: VariationLevel.Mixture, Test: { } test } => (test, sums.Cluster is not null, sums.Period is not null),
        { Test: var test } => (test!, true, false),
    };

    /// <summary>The verdict "supported": the basis could reject, does not, and the effect is shown negligible by its unrestricted form; by both of a mixture.</summary>
    public bool? Supported(double level, double bound) => CannotReject(level) == true ? false : SupportedWhateverTheCeiling(level, bound);

    /// <summary>The same without asking whether the basis could reject.</summary>
    public bool? SupportedWhateverTheCeiling(double level, double bound)
    {
        var (test, byCluster, byPeriod) = Declared;
        return test.P is not double p ? null
            : p > level
                && (byCluster || byPeriod || Negligible(Hc3, sums.Hc3, level, bound))
                && (!byCluster || Negligible(Cr2, _cr2.Value!.Covariance, level, bound))
                && (!byPeriod || Negligible(PeriodWald, _periodWald.Value!.Covariance, level, bound));
    }

    /// <summary>The null-imposed form's ceiling is above the level, so that the verdict is untestable; null when the basis has no value.</summary>
    public bool? CannotReject(double level)
    {
        var (test, byCluster, byPeriod) = Declared;
        return test.P is null ? null
            : (byCluster && ClusterF.Ceiling(group, sums.Cluster!).P > level) || (byPeriod && PeriodF.Ceiling(group, sums.Period!).P > level);
    }

    /// <summary>The same with the classical test as the basis.</summary>
    public bool? SupportedOnClassical(double level, double bound) => Classical is not FTest f ? null
        : f.Probability > level && NegligibleEffect.P(f, EffectiveRows.Classical(f.Df1, f.Df2), bound) <= level;

    private TestResult LastIn(int column) => PartialF.Of(AddedGroup.After(group.Final, [.. group.Kept.Where(other => other != column)], [column]));

    private bool Negligible(TestResult wald, double[,]? covariance, double level, double bound)
    {
        var df2 = PartialF.ResidualDf(group);
        return wald is FTest f && covariance is not null
            && EffectiveRows.Of(covariance, group.RssWith / df2, group.Rank, df2) is { } rows
            && NegligibleEffect.P(f, rows, bound) <= level;
    }
}
