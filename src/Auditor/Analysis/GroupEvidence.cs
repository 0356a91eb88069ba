using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Policies;

namespace Auditor.Analysis;

/// <summary>All tests and effect figures of one group on one row set, before adjustment and verdict.</summary>
internal sealed class GroupEvidence
{
    public GroupEvidence(GroupFit fit, Policy policy, bool sampling)
    {
        Fit = fit;
        var partial = PartialF.Of(fit.Added);
        Classical = sampling && partial is not NotComputable ? TestResult.None(Impediment.SamplingWeights) : partial;
        Hc = [.. Enum.GetValues<Heteroskedastic>().Select(estimator => WaldF.Of(fit.Added, fit.Sums, estimator))];
        Score = ScoreF.Of(fit.Added, fit.Sums);
        Ceiling = ScoreF.Ceiling(fit.Added, fit.Sums);
        Basis = Basis.Of(fit, Classical, Hc[(int)Heteroskedastic.Hc3], policy.BasisWithoutStructure, sampling);
        ClassicalInterval = Classical is FTest f
            ? EffectInterval.Of(f, EffectiveRows.Classical(f.Df1, f.Df2), policy.Significance)
            : null;
        if (Basis is { Test: FTest wald, EffectiveRows: { } rows })
        {
            BasisInterval = EffectInterval.Of(wald, rows, policy.Significance);
            NegligibleP = NegligibleEffect.P(wald, rows, policy.NegligiblePartialRSquared);
            Power = PowerEstimate.Of(fit, wald, rows, policy);
        }
    }

    public GroupFit Fit { get; }

    public TestResult Classical { get; }

    /// <summary>HC0 to HC3, in that order.</summary>
    public IReadOnlyList<TestResult> Hc { get; }

    public TestResult Score { get; }

    public TestResult Ceiling { get; }

    public Basis Basis { get; }

    public EffectInterval? ClassicalInterval { get; }

    public EffectInterval? BasisInterval { get; }

    /// <summary>p of the null that the partial R² is at least the policy's bound.</summary>
    public double? NegligibleP { get; }

    public PowerEstimate? Power { get; }

    /// <summary>Share of the residual sum of squares that the group takes out; null when nothing is left to take.</summary>
    public double? PartialRSquared =>
        Classical is NotComputable { Why: not Impediment.SamplingWeights } || Fit.Added.RssWithout <= 0
            ? null
            : Fit.Added.SumOfSquares / Fit.Added.RssWithout;
}

/// <summary>Power at the policy's bound, the f² that the policy's power finds, the rows needed to find the bound.</summary>
internal sealed record PowerEstimate(double AtBound, double? SmallestDetectable, double? RowsNeeded)
{
    public static PowerEstimate Of(GroupFit fit, FTest test, EffectiveRows rows, Policy policy)
    {
        var (level, bound) = (policy.Significance, policy.NegligiblePartialRSquared);
        var classical = test.Df1 + test.Df2 + 1;
        return new PowerEstimate(
            Power.AtBound(test.Df1, test.Df2, rows.LeastInformed, bound, level),
            Power.SmallestDetectable(test.Df1, test.Df2, rows.LeastInformed, level, policy.Power),
            Power.RowsNeeded(test.Df1, fit.Added.Final.Rank, rows.LeastInformed / classical, bound, level, policy.Power));
    }
}
