using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Policies;

namespace Auditor.Analysis;

/// <summary>What the tests of one group on one row set say under one policy's level, bound and power, before adjustment and verdict.</summary>
internal sealed class GroupEvidence
{
    private readonly Policy _policy;
    private readonly Lazy<EffectInterval?> _basisInterval;
    private readonly Lazy<double?> _negligibleP;
    private readonly Lazy<PowerEstimate?> _power;

    public GroupEvidence(GroupResults tests, Policy policy)
    {
        Tests = tests;
        _policy = policy;
        var (wald, rows) = (tests.Basis.Wald, tests.Basis.EffectiveRows);
        _basisInterval = new(() => wald is null || rows is null ? null : EffectInterval.Of(wald, rows, policy.Significance));
        FewDf = (tests.Basis.LeastDf ?? wald?.Df2) is double df && df < policy.NegligibleDf ? df : null;
        _negligibleP = new(() => wald is null || rows is null || FewDf is not null ? null : NegligibleEffect.P(wald, rows, policy.NegligiblePartialRSquared));
        _power = new(() => wald is null || rows is null ? null : PowerEstimate.Of(tests.Basis, wald, rows, policy));
    }

    public GroupResults Tests { get; }

    public GroupFit Fit => Tests.Fit;

    public Basis Basis => Tests.Basis;

    public EffectInterval? ClassicalInterval => Tests.Classical is FTest f
        ? EffectInterval.Of(f, EffectiveRows.Classical(f.Df1, f.Df2), _policy.Significance)
        : null;

    public EffectInterval? BasisInterval => _basisInterval.Value;

    /// <summary>Denominator degrees of freedom so few that the policy lets no effect be called negligible on them; null when there are enough.</summary>
    public double? FewDf { get; }

    /// <summary>p of the null that the partial R² is at least the policy's bound; null also on few degrees of freedom.</summary>
    public double? NegligibleP => _negligibleP.Value;

    public PowerEstimate? Power => _power.Value;

    /// <summary>The same tests under another level, bound or power.</summary>
    public GroupEvidence Under(Policy policy) => new(Tests, policy);
}

/// <summary>Power at the policy's bound, the f² that the policy's power finds, the rows needed to find the bound.</summary>
internal sealed record PowerEstimate(double AtBound, double? SmallestDetectable, double? RowsNeeded)
{
    public static PowerEstimate Of(Basis basis, FTest test, EffectiveRows rows, Policy policy)
    {
        var (level, bound) = (policy.Significance, policy.NegligiblePartialRSquared);
        return new PowerEstimate(
            Power.AtBound(test.Df1, test.Df2, rows.LeastInformed, bound, level),
            Power.SmallestDetectable(test.Df1, test.Df2, rows.LeastInformed, level, policy.Power),
            basis.Needed?.Invoke(bound, level, policy.Power));
    }
}
