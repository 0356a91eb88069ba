using Auditor.Numerics;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Verdict and materiality of one group after adjustment for the number of groups.</summary>
/// <param name="Adjusted">Adjusted p of the basis test; null when there is no p.</param>
/// <param name="NegligiblePAdjusted">Adjusted p of the negligible-effect test, which has a family of its own.</param>
internal sealed record Judgement(
    JudgedGroup Group, PValue? Adjusted, double? NegligiblePAdjusted, string Verdict, string Materiality, Policy Policy)
{
    public GroupEvidence? Evidence => Group.Evidence;

    /// <summary>What the verdict rests on, in a sentence.</summary>
    public string Reason => VerdictReason.Of(this, Group.ProductElsewhere, Policy);

    /// <summary>The same for who reads nothing else.</summary>
    public string InShort => VerdictInShort.Of(this);

    /// <summary>The only test of its family: adjustment changes nothing.</summary>
    public bool Alone { get; init; }

    public double? PAdjusted => Adjusted is { } p ? TestFigure.ShownP(p.P) : null;

    /// <summary>Judges all groups on one kind of row set as one family.</summary>
    /// <param name="groups">Null evidence: the group has no rows.</param>
    public static IReadOnlyList<Judgement> OfFamily(IReadOnlyList<JudgedGroup> groups, Policy policy)
    {
        var adjusted = Family.Adjust([.. groups.Select(group => group.Evidence is null ? null : TestFigure.P(group.Evidence.Basis.Test))], policy.Adjustment);
        var negligible = Family.Adjust([.. groups.Select(group => group.Evidence?.NegligibleP is double p ? PValue.Of(p) : (PValue?)null)], AdjustmentMethod.Holm);
        return [.. groups.Select((group, g) => Of(group, adjusted[g], negligible[g], adjusted.Count(p => p is not null) <= 1, policy))];
    }

    private static Judgement Of(JudgedGroup group, PValue? adjusted, PValue? negligible, bool alone, Policy policy)
    {
        var level = policy.Significance;
        var verdict = adjusted switch
        {
            null => Verdicts.Untestable,
            _ when group.Evidence!.Basis.CannotReject(level) => Verdicts.Untestable,
            _ when !group.Stands => Verdicts.Inconclusive,
            { P: var p } when p <= level => Verdicts.NotSupported,
            _ when negligible?.P <= level => Verdicts.Supported,
            _ => Verdicts.Inconclusive,
        };
        var materiality = MaterialityOf(group.Evidence, policy.NegligiblePartialRSquared);
        return new Judgement(group, adjusted, negligible?.P, verdict, materiality, policy) { Alone = alone };
    }

    private static string MaterialityOf(GroupEvidence? evidence, double bound) => evidence?.BasisInterval switch
    {
        { Upper: var upper } when upper < bound && evidence.FewDf is null => Materialities.ShownNegligible,
        { Lower: var lower } when lower > bound => Materialities.ShownMaterial,
        _ => Materialities.NotShown,
    };
}

/// <param name="ProductElsewhere">A product outside the group that holds one of its terms; null when there is none.</param>
internal sealed record JudgedGroup(GroupEvidence? Evidence, string? ProductElsewhere)
{
    /// <summary>A unit root of the final model's residual is not rejected and the group holds a term that is no change: series that drift look related when they are not.</summary>
    public bool Drifts { get; init; }

    /// <summary>Neither of the two keeps a verdict from being drawn from its p.</summary>
    public bool Stands => ProductElsewhere is null && !Drifts;

    public JudgedGroup Under(Policy policy) => this with { Evidence = Evidence?.Under(policy) };
}
