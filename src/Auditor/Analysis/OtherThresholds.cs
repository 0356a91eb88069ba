using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Judges the groups again, from the same tests, at usual levels and bounds.</summary>
internal static class OtherThresholds
{
    /// <summary>Beyond it the table says more than a reader can use.</summary>
    private const int MostGroups = 100;

    private static readonly double[] Levels = [0.001, 0.005, 0.01, 0.025, 0.05, 0.1, 0.2];
    private static readonly double[] Bounds = [0.001, 0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2];

    /// <summary>Null when there are no groups or too many.</summary>
    public static WhatIf? Of(IReadOnlyList<JudgedGroup> groups, Policy policy)
    {
        if (groups.Count is 0 or > MostGroups)
        {
            return null;
        }

        var levels = With(Levels, policy.Significance);
        var bounds = With(Bounds, policy.NegligiblePartialRSquared);
        return new WhatIf(
            policy.Significance, policy.NegligiblePartialRSquared, levels, bounds,
            [.. levels.Select(level => bounds.Select(bound => Outcomes(groups, policy.With(level, bound))).ToList())]);
    }

    private static List<WhatIfOutcome> Outcomes(IReadOnlyList<JudgedGroup> groups, Policy policy) =>
        [.. Judgement.OfFamily([.. groups.Select(group => group.Under(policy))], policy).Select(judgement => new WhatIfOutcome(judgement.Verdict, judgement.Materiality))];

    private static double[] With(double[] usual, double own) => [.. usual.Append(own).Distinct().Order()];
}
