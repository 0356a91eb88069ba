using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>What names a group in the record.</summary>
internal sealed record GroupIdentity(string Name, IReadOnlyList<string> Terms, string? Because, int? Line);

/// <summary>Puts an exclusion together from its judgement on the row set the policy asks for, the other one, and the common rows.</summary>
internal static class ExclusionFigures
{
    private const string NoCluster = "no cluster declared";
    private const string NoTime = "no time order declared";
    private const string CannotReject = "the test that would decide cannot reject on these data, however large the effect, so it has no power to state";

    /// <param name="common">The group on the rows common to all; null when there is none. Last in and the largest model's denominator need it.</param>
    /// <param name="selective">p given the rule that left the group out.</param>
    public static Exclusion Of(
        GroupIdentity identity, Judgement judgement, RowSetFit? rows, OtherRowSetFigures? other, GroupFit? common, SelectiveFigures selective, Policy policy, bool sampling)
    {
        var notComputed = new SortedDictionary<string, string>(StringComparer.Ordinal);
        notComputed["permutation"] = "not built yet";
        var evidence = judgement.Evidence;
        var added = evidence?.Fit.Added;
        var basisTest = evidence?.Basis.Test ?? TestResult.None(Impediment.NoRows);
        var why = Whys(basisTest, evidence);
        return new Exclusion(
            identity.Name,
            identity.Terms,
            rows is null ? 0 : (int)rows.Fit.N,
            added?.Rank,
            added is null ? null : PartialF.ResidualDf(added),
            added?.RssWithout,
            added?.RssWith,
            Tests(evidence, common, notComputed, sampling),
            notComputed,
            evidence?.Basis.Name ?? Basis.Hc3,
            evidence?.Basis.Reason ?? ImpedimentWords.Of(Impediment.NoRows),
            basisTest.P is double p ? TestFigure.ShownP(p) : null,
            TestFigure.P(basisTest) is { } basisP ? TestFigure.Log10(basisP.Log) : null,
            judgement.PAdjusted,
            judgement.Adjusted is { } adjusted ? TestFigure.Log10(adjusted.Log) : null,
            selective,
            Effect(evidence, why),
            evidence?.Basis.EffectiveRows?.LeastInformed,
            new NegligibleFigures(policy.NegligiblePartialRSquared, evidence?.NegligibleP, judgement.NegligiblePAdjusted, evidence?.NegligibleP is not null ? null : evidence?.FewDf is double few ? VerdictReason.FewDegreesOfFreedom(few, policy) : why["p"]),
            Power(judgement, why),
            other,
            judgement.Verdict,
            judgement.Materiality,
            judgement.Reason,
            rows is null || added is null ? [] : [.. added.Aliased.Select(column => AliasedWord.Of(column, rows.Plan.Labels))],
            rows is null || added is null ? [] : [.. added.NearlyAliased.Select(near => new NearlyAliasedColumn(rows.Plan.Labels[near.Column], near.DigitsLost))])
        {
            PowerCurve = judgement.Verdict == Verdicts.Inconclusive ? PowerCurves.Of(evidence, policy) : [],
            InShort = judgement.InShort,
            BasisSums = evidence?.Basis.Sums,
            Level = evidence?.Tests.Dependence.Level is { } level ? LevelWords.Of(level.Level) : null,
            BasisClustersOn = evidence is null ? null : ClustersOn(evidence.Basis, evidence.Fit.Dependence),
            EffectiveClusters = evidence?.Tests.Dependence.EffectiveClusters(evidence.Basis.Over),
            BasisTest = TestFigure.Of(basisTest, "basis", new Dictionary<string, string>()) is { } decides ? decides with { CeilingP = evidence?.Basis.Ceiling?.P } : null,
            Ceiling = evidence?.Basis is { Ceiling.P: double ceiling } basis ? new ScoreCeiling(ceiling, basis.CannotReject(policy.Significance), basis.Wald?.Probability) : null,
            Because = identity.Because,
            Line = identity.Line,
            Why = evidence?.Basis.Test is FTest && evidence.Basis.EffectiveRows is not null ? new Dictionary<string, string>() : why,
        };
    }

    /// <summary>The basis test on the other row set, with the verdict it would give there.</summary>
    public static OtherRowSetFigures Other(Judgement judgement, RowSetFit? rows)
    {
        var test = judgement.Evidence?.Basis.Test;
        var f = test as FTest;
        return new OtherRowSetFigures(
            rows is null ? 0 : (int)rows.Fit.N, f?.Statistic, f?.Df1, f?.Df2, test?.P is double p ? TestFigure.ShownP(p) : null, judgement.Verdict);
    }

    private static GroupTests Tests(GroupEvidence? evidence, GroupFit? common, SortedDictionary<string, string> notComputed, bool sampling)
    {
        TestFigures? Figure(string name, TestResult? result) => TestFigure.Of(result ?? TestResult.None(Impediment.NoRows), name, notComputed);
        TestFigures? Declared(string name, TestResult? result, string undeclared)
        {
            if (result is null && evidence is not null)
            {
                notComputed[name] = undeclared;
                return null;
            }

            return Figure(name, result);
        }

        TestFigures? Scored(string name, TestResult? result, TestResult? ceiling) =>
            Declared(name, result, name == "cluster" ? NoCluster : NoTime) is { } shown ? shown with { CeilingP = ceiling?.P } : null;

        var dependence = evidence?.Tests.Dependence;
        return new GroupTests(
            Figure("classical", evidence?.Tests.Classical),
            Figure("hc0", evidence?.Tests.Hc[0]),
            Figure("hc1", evidence?.Tests.Hc[1]),
            Figure("hc2", evidence?.Tests.Hc[2]),
            Figure("hc3", evidence?.Tests.Hc[3]),
            Figure("score", evidence?.Tests.Score) is { } score ? score with { CeilingP = evidence!.Tests.Ceiling.P } : null,
            Scored("cluster", dependence?.Cluster, dependence?.ClusterCeiling),
            Declared("cr1", dependence?.Cr1, NoCluster),
            Declared("cr2", dependence?.Cr2?.Test, NoCluster),
            Scored("time", dependence?.Time, dependence?.TimeCeiling),
            Declared("time_unrestricted", dependence?.PeriodWald?.Test, NoTime),
            Declared("newey_west", dependence?.NeweyWest, NoTime),
            null,
            Resampled(dependence, notComputed),
            JointOnly(common, "last_in", notComputed) ? null : LastIn(Against(common?.LastIn, sampling, PartialF.Of), Figure, notComputed),
            JointOnly(common, "largest_model_denominator", notComputed) ? null : Figure("largest_model_denominator", Against(common?.Largest, sampling, largest => PartialF.WithMeanSquareOf(common!.Added, largest))));
    }

    private static string? ClustersOn(Basis basis, Dependence dependence) => basis.Name != Basis.Cluster ? null
        : basis.Over.HasFlag(SummedOver.Unit) ? dependence.Unit : dependence.ClusteredBy;

    /// <summary>Resampling has no degrees of freedom: p with the interval that its draws leave open.</summary>
    private static PermutationFigures? Resampled(DependenceResults? dependence, SortedDictionary<string, string> notComputed)
    {
        switch (dependence?.WildBootstrap)
        {
            case ResampledTest test:
                return new PermutationFigures((dependence.Cr1 as FTest)?.Statistic, test.Probability, test.Lower, test.Upper, test.Draws);
            case NotComputable none:
                notComputed["wild_bootstrap"] = ImpedimentWords.Of(none.Why);
                return null;
            default:
                notComputed["wild_bootstrap"] = dependence is null ? ImpedimentWords.Of(Impediment.NoRows) : NoCluster;
                return null;
        }
    }

    private static TestFigures? LastIn(TestResult? result, Func<string, TestResult?, TestFigures?> figure, SortedDictionary<string, string> notComputed)
    {
        var shown = figure("last_in", result);
        if (result is NotComputable { Why: Impediment.AddsNothing })
        {
            notComputed["last_in"] = "the group adds no direction to the model with all other groups in it";
        }

        return shown;
    }

    /// <summary>All groups together are the largest model: both tests would be the partial F again.</summary>
    private static bool JointOnly(GroupFit? common, string name, SortedDictionary<string, string> notComputed)
    {
        var joint = common is { Largest: null };
        if (joint)
        {
            notComputed[name] = "all groups together are the largest model: the same as the partial F";
        }

        return joint;
    }

    private static TestResult? Against(Numerics.Factor.AddedGroup? model, bool sampling, Func<Numerics.Factor.AddedGroup, TestResult> test) =>
        model is null ? null : sampling ? TestResult.None(Impediment.SamplingWeights) : test(model);

    private static EffectFigures Effect(GroupEvidence? evidence, Dictionary<string, string> why) => new(
        evidence?.Tests.PartialRSquared,
        evidence?.ClassicalInterval?.Lower,
        evidence?.ClassicalInterval?.Upper,
        evidence?.BasisInterval?.Lower,
        evidence?.BasisInterval?.Upper,
        evidence?.BasisInterval is null ? why["p"] : null);

    /// <summary>Of a test that cannot reject there is no power to speak of: that of the other form beside it would only seem to be one.</summary>
    private static PowerFigures Power(Judgement judgement, Dictionary<string, string> why) => judgement is { Verdict: Verdicts.Untestable, Evidence: { Basis.Test: FTest, Power: not null } ofTest }
        ? new PowerFigures(null, null, null, CannotReject) { CountedIn = ofTest.Basis.CountedIn }
        : Power(judgement.Evidence, why);

    private static PowerFigures Power(GroupEvidence? evidence, Dictionary<string, string> why) => evidence?.Power is { } power
        ? new PowerFigures(power.AtBound, power.SmallestDetectable, power.RowsNeeded, power.RowsNeeded is null ? $"no practicable number of {evidence.Basis.CountedIn} is enough" : null)
        {
            CountedIn = evidence.Basis.CountedIn,
        }
        : new PowerFigures(null, null, null, why["p"]);

    /// <summary>Why p and everything that follows from it has no value.</summary>
    private static Dictionary<string, string> Whys(TestResult basis, GroupEvidence? evidence)
    {
        var reason = basis switch
        {
            NotComputable none => ImpedimentWords.Of(none.Why),
            PerfectWithGroup => "the model with the group fits perfectly, so no effect figure can be given",
            _ when evidence?.Basis.EffectiveRows is null => ImpedimentWords.Of((evidence?.Basis.Unrestricted as NotComputable)?.Why ?? Impediment.SingularCovariance),
            _ => "",
        };
        return new Dictionary<string, string>(StringComparer.Ordinal)
        {
            ["p"] = reason,
            ["p_adjusted"] = reason,
            ["effective_rows"] = reason,
        };
    }
}
