using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>
/// The record against case.json, figure by figure: values by R and its econometrics packages, repeated with numpy and statsmodels
/// (tests/reference/SOURCES.md, AGREEMENT.md). The tolerance is the one within which those routes agree.
/// </summary>
public sealed class ComparisonTests
{
    [Theory]
    [MemberData(nameof(Runs.Declarations), MemberType = typeof(Runs))]
    public void The_record_agrees_with_other_programs(string name, string variant)
    {
        CaseRun run = CaseRuns.Of(name, variant);
        Report.AssertAllHold(run.Figures(), run.Case.Tolerance);
    }

    [Theory]
    [MemberData(nameof(Runs.Declarations), MemberType = typeof(Runs))]
    public void Variance_inflation_agrees_with_other_programs(string name, string variant)
    {
        CaseRun run = CaseRuns.Of(name, variant);
        IReadOnlyList<Figure> figures = [.. VarianceInflationFigures.Of(run)];
        Assert.All(figures, figure => Assert.True(figure.Holds(run.Case.Tolerance), figure.Describe()));
    }

    [Theory]
    [MemberData(nameof(Runs.Declarations), MemberType = typeof(Runs))]
    public void Columns_that_add_nothing_are_named(string name, string variant)
    {
        CaseRun run = CaseRuns.Of(name, variant);
        Assert.Equal(Dropped(run, run.Fit), Sorted(RecordView.Aliased(run.Record.FinalFit)));
        if (!run.IsLargest)
        {
            Assert.All(run.Case.Groups, group => Assert.Equal(Dropped(run, group), Sorted(RecordView.Aliased(run.Record.Exclusion(group.Text("group"))))));
        }
    }

    [Fact]
    public void A_group_that_adds_no_column_cannot_be_tested()
    {
        var group = CaseRuns.Of("pea_yield_npk").Record.Exclusion("field_half");
        Assert.Equal("untestable", group.Text("verdict"));
        Assert.Null(group.Number("p"));
        Assert.Null(RecordView.Test(group, "classical").Number("f"));
    }

    [Fact]
    public void A_perfect_larger_model_has_no_f_and_p_zero()
    {
        RecordView record = CaseRuns.Of("nist_wampler1").Record;
        Assert.Null(RecordView.Test(record.AllLeftOut, "classical").Number("f"));
        Assert.Equal(0, RecordView.Test(record.AllLeftOut, "classical").Number("p")?.Number);
    }

    private static string[] Dropped(CaseRun run, System.Text.Json.JsonElement owner) => Sorted(owner.Texts("columns_dropped_as_aliased").Select(run.Label));

    private static string[] Sorted(IEnumerable<string> names) => [.. names.Order(StringComparer.Ordinal)];
}
