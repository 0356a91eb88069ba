using System.Globalization;
using Auditor.Results;

namespace Auditor.Tests.Analysis;

/// <summary>What the page says would follow from another level or bound is what an audit under that policy says.</summary>
public sealed class OtherThresholdsTests
{
    private static readonly string Demo = Path.Combine(TestFolders.Demo, "declaration.yaml");
    private static readonly WhatIf Tried = AuditRunner.Record(Demo, "").WhatIf!;

    [Theory]
    [InlineData(0.001, 0.01)]
    [InlineData(0.2, 0.01)]
    [InlineData(0.05, 0.02)]
    [InlineData(0.1, 0.05)]
    [InlineData(0.025, 0.001)]
    public void A_trial_agrees_with_an_audit_under_that_policy(double level, double bound)
    {
        var audited = AuditRunner.Record(Demo, string.Create(CultureInfo.InvariantCulture, $"significance: {level}\nnegligible_partial_r_squared: {bound}\n"));

        Assert.Equal(audited.Exclusions.Select(exclusion => new WhatIfOutcome(exclusion.Verdict, exclusion.Materiality)), At(level, bound));
        Assert.NotEqual(At(Tried.Level, Tried.Bound), At(level, bound));
    }

    [Fact]
    public void The_policy_in_force_is_among_what_can_be_tried()
    {
        var audited = AuditRunner.Record(Demo, "significance: 0.037\nnegligible_partial_r_squared: 0.013\n");
        var tried = audited.WhatIf!;

        Assert.Equal((0.037, 0.013), (tried.Level, tried.Bound));
        Assert.Contains(0.037, tried.Levels);
        Assert.Contains(0.013, tried.Bounds);
        Assert.Equal(tried.Levels.Order(), tried.Levels);
        Assert.All(tried.Outcomes, level => Assert.Equal(tried.Bounds.Count, level.Count));
    }

    private static IReadOnlyList<WhatIfOutcome> At(double level, double bound) =>
        Tried.Outcomes[Tried.Levels.ToList().IndexOf(level)][Tried.Bounds.ToList().IndexOf(bound)];
}
