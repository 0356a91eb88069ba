using Auditor.Numerics.GroupTests;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Verdict and materiality of one group after adjustment for the number of groups.</summary>
/// <param name="LogPAdjusted">Natural log of the adjusted p of the basis test; null when there is no p.</param>
/// <param name="NegligiblePAdjusted">Adjusted p of the negligible-effect test, which has a family of its own.</param>
internal sealed record Judgement(
    GroupEvidence? Evidence, double? LogPAdjusted, double? NegligiblePAdjusted, string Verdict, string Materiality, string Reason)
{
    public double? PAdjusted => LogPAdjusted is double logP ? TestFigure.ShownP(Math.Exp(logP)) : null;

    /// <summary>Judges all groups on one kind of row set as one family.</summary>
    /// <param name="groups">Null evidence: the group has no rows.</param>
    public static IReadOnlyList<Judgement> OfFamily(IReadOnlyList<JudgedGroup> groups, Policy policy)
    {
        var adjusted = Family.Adjust([.. groups.Select(group => group.Evidence is null ? null : TestFigure.LogP(group.Evidence.Basis.Test))], policy.Adjustment);
        var negligible = Family.Adjust([.. groups.Select(group => LogOf(group.Evidence?.NegligibleP))], AdjustmentMethod.Holm);
        return [.. groups.Select((group, g) => Of(group, adjusted[g], negligible[g], policy))];
    }

    private static double? LogOf(double? p) => p is double value ? Math.Log(value) : null;

    private static Judgement Of(JudgedGroup group, double? logP, double? logNegligible, Policy policy)
    {
        var level = Math.Log(policy.Significance);
        double? negligible = logNegligible is double log ? Math.Exp(log) : null;
        var verdict = logP switch
        {
            null => Verdicts.Untestable,
            _ when group.ProductElsewhere is not null => Verdicts.Inconclusive,
            double value when value <= level => Verdicts.NotSupported,
            _ when logNegligible <= level => Verdicts.Supported,
            _ => Verdicts.Inconclusive,
        };
        var materiality = MaterialityOf(group.Evidence?.BasisInterval, policy.NegligiblePartialRSquared);
        var judgement = new Judgement(group.Evidence, logP, negligible, verdict, materiality, "");
        return judgement with { Reason = VerdictReason.Of(judgement, group.ProductElsewhere, policy) };
    }

    private static string MaterialityOf(EffectInterval? interval, double bound) => interval switch
    {
        { Upper: var upper } when upper < bound => Materialities.ShownNegligible,
        { Lower: var lower } when lower > bound => Materialities.ShownMaterial,
        _ => Materialities.NotShown,
    };
}

/// <param name="ProductElsewhere">A product outside the group that holds one of its terms; null when there is none.</param>
internal sealed record JudgedGroup(GroupEvidence? Evidence, string? ProductElsewhere);
