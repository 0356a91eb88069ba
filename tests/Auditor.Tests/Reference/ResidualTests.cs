using System.Globalization;
using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>What the comparison of figures does not cover of residual checks and influence: lists, order, published values, p that is only bounded.</summary>
public sealed class ResidualTests
{
    /// <summary>
    /// Values as printed. Economics journals: Kleiber and Zeileis 2008, Applied Econometrics with R, section 4.2 (from the reference output of the
    /// package AER). Money demand: reference output of the package lmtest. The wording is that of published_values in case.json.
    /// </summary>
    public static TheoryData<string, string, string, string> Published => new()
    {
        { "economics_journals", "Breusch-Pagan studentised", "breusch_pagan", "statistic" },
        { "economics_journals", "p", "breusch_pagan", "p" },
        { "economics_journals", "RESET", "reset", "statistic" },
        { "money_demand", "Breusch-Pagan original", "breusch_pagan_original", "statistic" },
        { "money_demand", "p Breusch-Pagan original", "breusch_pagan_original", "p" },
        { "money_demand", "Breusch-Pagan studentised", "breusch_pagan", "statistic" },
        { "money_demand", "p Breusch-Pagan studentised", "breusch_pagan", "p" },
        { "money_demand", "RESET F (2, 86)", "reset", "statistic" },
    };

    [Theory]
    [MemberData(nameof(Published))]
    public void Published_values_are_met_to_the_last_printed_digit(string name, string what, string check, string field)
    {
        CaseRun run = CaseRuns.Of(name);
        string printed = run.Case.Values.GetProperty("published_values").Find("what", what)!.Value.Text("published");
        int decimals = printed.Length - 1 - printed.IndexOf('.', StringComparison.Ordinal);
        double found = run.Record.Checks.Find("check", check)!.Value.GetProperty(field).GetDouble();
        Assert.Equal(printed, Math.Round(found, decimals).ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture));
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

    /// <summary>Order of the ten rows; rows whose distances differ by rounding alone may stand either way.</summary>
    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void The_ten_largest_stand_in_falling_order(string name)
    {
        double[] distances = [.. CaseRuns.Of(name).Record.Influence.GetProperty("largest").EnumerateArray().Select(row => row.GetProperty("cooks_distance").GetDouble())];
        Assert.Equal(Math.Min(10, CaseRuns.Of(name).Record.FinalFit.GetProperty("rows").GetInt32()), distances.Length);
        Assert.Equal(distances.OrderDescending(), distances);
    }

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Every_check_is_listed_in_order(string name) => Assert.Equal(
        [
            "breusch_pagan", "breusch_pagan_original", "white", "jarque_bera", "shapiro_wilk", "anderson_darling", "durbin_watson", "breusch_godfrey_1",
            "breusch_godfrey_4", "ljung_box_4", "unit_root_residual", "reset", "largest_residual", "chow",
        ],
        CaseRuns.Of(name, "").Record.Checks.EnumerateArray().Select((JsonElement check) => check.Text("check")));

    /// <summary>Rejects is p at most the level, of the simulated p where there is one; a check without a p rejects nothing and says why.</summary>
    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void What_rejects_rests_on_its_p(string name)
    {
        const double level = 0.05;
        Assert.All(CaseRuns.Of(name).Record.Checks.EnumerateArray(), check =>
        {
            Quantity? p = check.TryGetProperty("p_simulated", out _) ? check.Number("p_simulated") : check.Number("p");
            Assert.Equal(p is null ? JsonValueKind.Null : p.Value.Number <= level ? JsonValueKind.True : JsonValueKind.False, check.GetProperty("rejects").ValueKind);
            Assert.True(p is not null || check.Text("why").Length > 0);
        });
    }

    /// <summary>AGREEMENT.md, point 5: beyond an adjusted A² of 10 the published formula has left its range, and p is below 1e-20.</summary>
    [Fact]
    public void A_large_Anderson_Darling_statistic_has_a_bounded_p()
    {
        JsonElement check = CaseRuns.Of("diamonds").Record.Checks.Find("check", "anderson_darling")!.Value;
        Assert.InRange(check.GetProperty("p").GetDouble(), 0, 1e-20);
        Assert.Contains("at most", check.Text("variant"), StringComparison.Ordinal);
    }
}
