using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>
/// Intervals and power against case.json, where both come from a Poisson mixture series for the noncentral F that a second program
/// repeats to 1e-10 (AGREEMENT.md, point 6).
/// </summary>
public sealed class EffectSizeTests
{
    public static TheoryData<string, double> Effects
    {
        get
        {
            TheoryData<string, double> rows = [];
            foreach (ReferenceCase one in ReferenceCases.All)
            {
                rows.Add(one.Name, 0.02);
                rows.Add(one.Name, 0.15);
                rows.Add(one.Name, 0.35);
            }

            return rows;
        }
    }

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void The_interval_of_partial_r_squared_agrees(string name)
    {
        CaseRun run = CaseRuns.Of(name);
        Report.AssertAllHold([.. EffectFigures.Intervals(run)], run.Case.Tolerance);
    }

    [Theory]
    [MemberData(nameof(Effects))]
    public void Power_agrees(string name, double fSquared)
    {
        CaseRun run = CaseRuns.Of(name, policyLine: EffectFigures.PolicyLine(fSquared));
        Report.AssertAllHold([.. EffectFigures.Power(run, fSquared)], 1e-8);
    }
}
