using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Policies;

namespace Auditor.Analysis;

/// <summary>
/// The test on which a group's verdict rests, fixed by declaration and policy and never by a test on the same data: HC3 unless the policy says
/// classical; classical where a robust form does not exist by the group's own making.
/// </summary>
/// <param name="Name">The record's name of the test.</param>
/// <param name="Reason">Why this one, in words.</param>
/// <param name="EffectiveRows">Null when the test has no value.</param>
internal sealed record Basis(string Name, string Reason, TestResult Test, EffectiveRows? EffectiveRows)
{
    /// <summary>The F of the same covariance without the null imposed: intervals, power and the negligible-effect test rest on it. Null when there is none.</summary>
    public FTest? Wald => Test as FTest;

    public const string Classical = "classical";
    public const string Hc3 = "hc3";

    public static Basis Of(GroupFit fit, TestResult classical, TestResult hc3, BasisWithoutStructure policy, bool sampling)
    {
        if (classical is PerfectWithGroup)
        {
            return OnClassical(classical, "with the group in, the model fits perfectly; a robust form does not exist");
        }

        if (fit.Sums.RestsOn.Count > 0 && !sampling)
        {
            return OnClassical(classical, "the group rests on one row; a robust form does not exist");
        }

        return policy == BasisWithoutStructure.Classical && !sampling
            ? OnClassical(classical, "no cluster or time order is declared and the policy says classical")
            : OnHc3(fit, hc3, sampling ? "sampling weights: only a robust test applies" : "no cluster or time order is declared: HC3 holds its level when variances differ");
    }

    private static Basis OnClassical(TestResult test, string reason) =>
        new(Classical, reason, test, test is FTest f ? Numerics.GroupTests.EffectiveRows.Classical(f.Df1, f.Df2) : null);

    private static Basis OnHc3(GroupFit fit, TestResult test, string reason)
    {
        if (test is not FTest f)
        {
            return new Basis(Hc3, reason, test, null);
        }

        var meanSquare = fit.Added.RssWith / f.Df2;
        return new Basis(Hc3, reason, test, Numerics.GroupTests.EffectiveRows.Of(fit.Sums.Hc3, meanSquare, f.Df1, f.Df2));
    }
}
