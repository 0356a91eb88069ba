using Auditor.Numerics.GroupTests;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The power of a group's basis test over a range of effects that holds the policy's bound and the effect that is found reliably.</summary>
internal static class PowerCurves
{
    private const int Steps = 40;
    private const double Beyond = 1.4;

    public static IReadOnlyList<PowerPoint> Of(GroupEvidence? evidence, Policy policy)
    {
        if (evidence is not { Basis: { Wald: { } test, EffectiveRows: { } rows }, Power: { } power })
        {
            return [];
        }

        var reliable = power.SmallestDetectable is double f ? f / (1 + f) : 0;
        var end = Math.Min(0.99, Beyond * Math.Max(policy.NegligiblePartialRSquared, reliable));
        return [.. Enumerable.Range(0, Steps + 1).Select(step => step * end / Steps).Select(effect => new PowerPoint(
            effect, Power.AtBound(test.Df1, test.Df2, rows.LeastInformed, effect, policy.Significance)))];
    }
}
