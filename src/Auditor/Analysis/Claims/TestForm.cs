using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>One form of a test that an author may have printed.</summary>
/// <param name="By">Null for the classical one.</param>
internal sealed record TestForm(string? By, bool OtherRows, double? F, double? Df1, double? Df2, double? P)
{
    /// <summary>The group's tests on the rows shown, then on the other row set; the classical one first on each.</summary>
    public static IReadOnlyList<TestForm> OfGroup(GroupTests tests, GroupFit? other, bool sampling) =>
    [
        .. Shown(null, tests.Classical),
        .. Shown("hc0", tests.Hc0),
        .. Shown("hc1", tests.Hc1),
        .. Shown("hc2", tests.Hc2),
        .. Shown("hc3", tests.Hc3),
        .. Shown("cr1", tests.Cr1),
        .. Shown("cr2", tests.Cr2),
        .. Shown("newey_west", tests.NeweyWest),
        .. Shown("cluster", tests.Cluster),
        .. Shown("time", tests.Time),
        .. Shown("score", tests.Score),
        .. Shown("largest_model_denominator", tests.LargestModelDenominator),
        .. Shown("last_in", tests.LastIn),
        .. other is null ? [] : Other(other, sampling),
    ];

    public static IReadOnlyList<TestForm> OfStep(StepResult step) => step.P is null && step.F is null ? [] : [new(null, false, step.F, step.Df1, step.Df2, step.P)];

    private static IEnumerable<TestForm> Shown(string? by, TestFigures? test) => test is null ? [] : [new(by, false, test.F, test.Df1, test.Df2, test.P)];

    private static IEnumerable<TestForm> Other(GroupFit fit, bool sampling) =>
    [
        .. sampling ? [] : Of(null, PartialF.Of(fit.Added)),
        .. Enum.GetValues<Heteroskedastic>().SelectMany(form => Of(form.ToString().ToLowerInvariant(), WaldF.Of(fit.Added, fit.Sums, form))),
    ];

    private static IEnumerable<TestForm> Of(string? by, TestResult result) => result switch
    {
        FTest test => [new(by, true, test.Statistic, test.Df1, test.Df2, test.Probability)],
        PerfectWithGroup perfect => [new(by, true, null, perfect.Df1, perfect.Df2, 0)],
        _ => [],
    };
}
