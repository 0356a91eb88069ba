using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Residual checks and influence of the final model against the reference cases.</summary>
public sealed class ResidualTests
{
    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Residual_checks_agree_with_other_programs(string name)
    {
        CaseRun run = CaseRuns.Of(name, "");
        Report.AssertAllHold([.. ResidualCheckFigures.Of(run)], run.Case.Tolerance);
    }

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Influence_agrees_with_other_programs(string name)
    {
        CaseRun run = CaseRuns.Of(name, "");
        Report.AssertAllHold([.. InfluenceFigures.Of(run)], run.Case.Tolerance);
    }

    [Fact]
    public void Variance_proportions_agree_with_other_programs()
    {
        int compared = 0;
        foreach (CaseRun run in ReferenceCases.All.Select(one => CaseRuns.Of(one.Name, "")))
        {
            IReadOnlyList<Figure> figures = [.. VarianceProportionFigures.Of(run)];
            compared += figures.Count;
            if (figures.Count > 0)
            {
                Report.AssertAllHold(figures, Math.Max(1e-6, run.Case.Tolerance));
            }
        }

        Assert.True(compared > 100, $"only {compared} proportions compared");
    }

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Rows_with_leverage_one_are_named(string name)
    {
        CaseRun run = CaseRuns.Of(name, "");
        Assert.Equal(
            run.Case.Values.GetProperty("influence").GetProperty("rows_with_leverage_one").EnumerateArray().Select(row => row.GetInt32()),
            run.Record.Influence.GetProperty("leverage_one").EnumerateArray().Select(row => row.GetInt32()));
    }

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Every_check_is_listed_in_order(string name) => Assert.Equal(
        [
            "breusch_pagan", "breusch_pagan_original", "white", "jarque_bera", "shapiro_wilk", "anderson_darling", "durbin_watson", "breusch_godfrey_1",
            "breusch_godfrey_4", "ljung_box_4", "unit_root_residual", "reset", "largest_residual", "chow",
        ],
        CaseRuns.Of(name, "").Record.Checks.EnumerateArray().Select((JsonElement check) => check.Text("check")));
}
