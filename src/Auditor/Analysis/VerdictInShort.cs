using Auditor.Numerics;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The reason of a verdict for who reads nothing else: one short sentence with one number at most.</summary>
internal static class VerdictInShort
{
    public static string Of(Judgement judgement) => judgement switch
    {
        { Evidence: null } => "No row is complete for it.",
        { Evidence.Basis.Test: NotComputable none } => Sentence(ImpedimentWords.Of(none.Why)),
        { Verdict: Verdicts.Untestable } => $"However large its effect, the {BasisWords.Of(judgement.Evidence!.Basis)} could not reject leaving it out.",
        { Group.Drifts: true } => "The residual may drift, and series that drift look related when they are not.",
        { Group.ProductElsewhere: { } product } => $"Its test depends on how variables are coded, because {product} is outside the group.",
        { Verdict: Verdicts.NotSupported, Evidence.Basis.Test: PerfectWithGroup } => "With it the model fits these rows perfectly; without it, it does not.",
        { Verdict: Verdicts.NotSupported, Materiality: Materialities.ShownNegligible } =>
            $"There is an effect, but the data show it to be negligible: partial R² is below {Bound(judgement.Policy)}.",
        { Verdict: Verdicts.NotSupported } => "Jointly it explains more than chance would" + Share(judgement) + ".",
        { Verdict: Verdicts.Supported } => $"No effect is found, and one that matters is ruled out: partial R² is below {Bound(judgement.Policy)}.",
        _ when judgement.Evidence!.Basis.Test.P <= judgement.Policy.Significance =>
            "Its test rejects by itself, but not once the number of groups is allowed for" + Possible(judgement) + ".",
        _ => "No effect is found, but one that matters is not ruled out" + Possible(judgement) + ".",
    };

    private static string Sentence(string words) => char.ToUpperInvariant(words[0]) + words[1..] + ".";

    private static string Share(Judgement judgement) => judgement.Evidence!.Tests.PartialRSquared is double share
        ? $": {PlainNumber.Digits(100 * share, 2)} % of what the final model leaves over"
        : "";

    private static string Possible(Judgement judgement) => judgement.Evidence!.BasisInterval is { } interval && interval.Upper >= judgement.Policy.NegligiblePartialRSquared
        ? $": partial R² may be as large as {PlainNumber.Share(interval.Upper)}"
        : judgement.Evidence.BasisInterval is null ? ": its size cannot be judged"
        : judgement.Evidence.FewDf is not null ? ": too few degrees of freedom stand behind its spread" : ": the test for that fails once the number of groups is allowed for";

    private static string Bound(Policy policy) => PlainNumber.Digits(policy.NegligiblePartialRSquared, 4);
}
