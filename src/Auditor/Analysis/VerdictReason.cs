using System.Globalization;
using Auditor.Numerics;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>One sentence that says what a verdict rests on, with its numbers.</summary>
internal static class VerdictReason
{
    public static string Of(Judgement judgement, string? productElsewhere, Policy policy)
    {
        if (judgement.Evidence is not { } evidence)
        {
            return "Nothing can be tested: " + ImpedimentWords.Of(Impediment.NoRows) + ".";
        }

        if (evidence.Basis.Test is NotComputable none)
        {
            return "The data cannot test this: " + ImpedimentWords.Of(none.Why) + ".";
        }

        if (judgement.Verdict == Verdicts.Untestable)
        {
            return $"The data cannot test this: however large the effect, the {BasisWords.Of(evidence.Basis)} cannot reach the level"
                + $" {PlainNumber.Digits(policy.Significance, 4)} ({PlainNumber.PAgainst(evidence.Basis.Ceiling!.P!.Value, policy.Significance)} is where it ends as the effect grows){Beside(evidence, policy)}.";
        }

        if (judgement.Group.Drifts)
        {
            return $"The residual of the final model may drift, and series that drift look related when they are not: no verdict can rest on this test ({Test(judgement, policy)}).";
        }

        return productElsewhere is not null
            ? $"The test depends on how variables are coded, because {productElsewhere} is outside the group: no verdict can rest on it ({Test(judgement, policy)})."
            : Sentence(judgement, evidence, policy);
    }

    private static string Sentence(Judgement judgement, GroupEvidence evidence, Policy policy) => judgement.Verdict switch
    {
        Verdicts.NotSupported when evidence.Basis.Test is PerfectWithGroup =>
            "With the group in, the model fits these rows perfectly; without it, it does not.",
        Verdicts.NotSupported when judgement.Materiality == Materialities.ShownNegligible =>
            $"The data show an effect ({Test(judgement, policy)}), but a negligible one: partial R² is below {Bound(policy)} (interval {Interval(evidence)}).",
        Verdicts.NotSupported =>
            $"The data contradict leaving it out: jointly, its terms explain more than chance would ({Test(judgement, policy)}).",
        Verdicts.Supported =>
            $"The test does not reject leaving it out ({Test(judgement, policy)}), and the data show that any effect is negligible: partial R² is below {Bound(policy)} "
            + $"(negligible-effect test, adjusted {PlainNumber.PAgainst(judgement.NegligiblePAdjusted!.Value, policy.Significance)}).",
        _ => $"The test does not reject leaving it out ({Test(judgement, policy)}), but the data cannot show that its effect is negligible: {Possible(evidence, policy)}{Needed(evidence, policy)}.",
    };

    private static string Beside(GroupEvidence evidence, Policy policy) => evidence.Basis.Wald is { } wald
        ? $"; with the group in the model the same kind of test gives {PlainNumber.PAgainst(wald.Probability, policy.Significance)}"
        : "";

    private static string Test(Judgement judgement, Policy policy)
    {
        var test = judgement.Evidence!.Basis.Test;
        var p = judgement.PAdjusted is double adjusted ? (judgement.Alone ? "" : "adjusted ") + PlainNumber.PAgainst(adjusted, policy.Significance) : "no p";
        p += RejectedBeforeAdjustment(judgement, policy) ? ", before adjustment " + PlainNumber.PAgainst(test.P!.Value, policy.Significance) : "";
        return test is FTest f
            ? string.Create(CultureInfo.InvariantCulture, $"{BasisWords.Of(judgement.Evidence.Basis)}: F = {PlainNumber.Number(f.Statistic)} on {PlainNumber.Count(f.Df1)} and {PlainNumber.Count(f.Df2)} degrees of freedom, {p}")
            : p;
    }

    private static bool RejectedBeforeAdjustment(Judgement judgement, Policy policy) =>
        judgement.PAdjusted > policy.Significance && judgement.Evidence!.Basis.Test.P <= policy.Significance;

    private static string Bound(Policy policy) => PlainNumber.Digits(policy.NegligiblePartialRSquared, 4);

    private static string Interval(GroupEvidence evidence) => evidence.BasisInterval is { } interval
        ? PlainNumber.Share(interval.Lower) + " to " + PlainNumber.Share(interval.Upper)
        : "not computed";

    /// <summary>Why no effect is called negligible on few degrees of freedom.</summary>
    public static string FewDegreesOfFreedom(double df, Policy policy) =>
        $"the covariance rests on {PlainNumber.Digits(df, 3)} {(df == 1 ? "degree" : "degrees")} of freedom, and on fewer than {PlainNumber.Count(policy.NegligibleDf)} no effect is called negligible (policy negligible_df)";

    private static string Possible(GroupEvidence evidence, Policy policy) => evidence.BasisInterval is { } interval && interval.Upper >= policy.NegligiblePartialRSquared
        ? $"partial R² may be as large as {PlainNumber.Share(interval.Upper)}, and {Bound(policy)} is the most that counts as negligible"
        : evidence.BasisInterval is null
            ? $"the size of the effect cannot be judged ({ImpedimentWords.Of((evidence.Basis.Unrestricted as NotComputable)?.Why ?? Impediment.SingularCovariance)})"
            : evidence.FewDf is double few ? FewDegreesOfFreedom(few, policy)
            : $"the test that partial R² is below {Bound(policy)} does not hold after adjustment for the number of groups";

    private static string Needed(GroupEvidence evidence, Policy policy) =>
        evidence.Power?.RowsNeeded is double rows && evidence.Power.AtBound < policy.Power
            ? $"; about {PlainNumber.Count(rows)} {evidence.Basis.CountedIn} like these would make the test reject an effect of that size with {PlainNumber.Digits(100 * policy.Power, 3)} % power, before adjustment"
            : "";
}

/// <summary>The basis tests' names in sentences.</summary>
internal static class BasisWords
{
    public static string Of(Basis basis) => (basis.Name, basis.Sums) switch
    {
        (Basis.Hc3, _) => "robust HC3 test",
        (Basis.Cluster, int sums) when basis.Over.HasFlag(SummedOver.Unit) => $"test over {PlainNumber.Count(sums)} units",
        (Basis.Cluster, int sums) => $"test over {PlainNumber.Count(sums)} clusters",
        (Basis.Time, int sums) => $"test over {PlainNumber.Count(sums)} periods",
        _ => "classical test",
    };
}
