using System.Collections.Concurrent;
using System.Text.Json;
using Auditor.Analysis;
using Auditor.Design;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;
using Auditor.Rows;
using Auditor.SelfTest;
using CheckFigures = Auditor.Analysis.ResidualCheckFigures;

namespace Auditor.Tests.Reference;

/// <summary>
/// Checks of the order and of a split, rows taken in the order of the file whether or not that is time, against R (lmtest, stats), repeated with numpy and statsmodels
/// (case.json; AGREEMENT.md). They are made on the audit's own fit; no declaration can ask for them yet.
/// </summary>
public sealed class SerialCheckTests
{
    private static readonly (string Check, string Case)[] ChiSquares =
    [
        ("breusch_godfrey_1", "breusch_godfrey_order_1"), ("breusch_godfrey_4", "breusch_godfrey_order_4"), ("ljung_box_4", "ljung_box_lag_4"),
    ];

    private static readonly ConcurrentDictionary<(string Name, int? Split), Lazy<Dictionary<string, CheckResult>>> Kept = new();

    /// <summary>Imhof's integral of the cases is accurate to 1e-13, not relative to p.</summary>
    private const double ImhofAccuracy = 1e-12;

    /// <summary>Printed in the reference output of lmtest for money demand.</summary>
    [Fact]
    public void Published_values_are_met()
    {
        var checks = Checks("money_demand", 34);
        Assert.Equal(0.18142, checks["durbin_watson"].Statistic!.Value, 0.5e-5);
        Assert.Equal(58.314, checks["chow"].Statistic!.Value, 0.5e-3);
    }

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Durbin_Watson_agrees(string name)
    {
        var (one, found, tolerance) = Of(name, "durbin_watson", "durbin_watson");
        if (one.Optional("not_computed") is not null)
        {
            Assert.NotNull(found.Why);
            return;
        }

        Near(one.GetProperty("d").GetDouble(), found.Statistic, tolerance);
        if (one.Optional("p_positive_autocorrelation_exact") is { ValueKind: JsonValueKind.Number } exact)
        {
            Assert.Equal(exact.GetDouble(), found.P!.Value, Math.Max(ImhofAccuracy, tolerance));
        }
        else if (found.Variant is not null && one.Optional("p_positive_autocorrelation_normal_approximation") is { ValueKind: JsonValueKind.Number } normal)
        {
            Near(normal.GetDouble(), found.P, 1e-7);
        }
    }

    /// <summary>Source: R's normal approximation for the two cases above 2,000 rows; for the others it is not used.</summary>
    [Theory]
    [InlineData("diamonds", true)]
    [InlineData("petersen_panel", true)]
    [InlineData("california_schools", false)]
    public void P_is_normal_above_2000_rows(string name, bool normal) =>
        Assert.Equal(normal, Checks(name, null)["durbin_watson"].Variant?.Contains("normal law", StringComparison.Ordinal) ?? false);

    [Theory]
    [MemberData(nameof(Runs.Cases), MemberType = typeof(Runs))]
    public void Breusch_Godfrey_and_Ljung_Box_agree(string name)
    {
        foreach (var (check, key) in ChiSquares)
        {
            var (one, found, tolerance) = Of(name, check, key);
            var expected = one.Optional("chi_square_form") ?? one;
            if (expected.Optional("not_computed") is null)
            {
                Near(expected.GetProperty("statistic").GetDouble(), found.Statistic, tolerance);
                Assert.Equal(expected.GetProperty("df").GetDouble(), found.Df);
                Near(expected.GetProperty("log10_p").GetDouble(), Math.Log10(found.P!.Value) is var log && double.IsFinite(log) ? log : found.Log10P, Math.Max(1e-7, 10 * tolerance));
            }
        }
    }

    [Theory]
    [InlineData("us_investment")]
    [InlineData("us_consumption_lag")]
    [InlineData("money_demand")]
    [InlineData("nist_longley")]
    public void Chow_agrees(string name)
    {
        var one = ReferenceCases.Named(name).Values.GetProperty("chow_test");
        var found = Checks(name, one.GetProperty("first_segment_rows").GetInt32())["chow"];
        var tolerance = 10 * ReferenceCases.Named(name).Tolerance;
        Near(one.GetProperty("F").GetDouble(), found.Statistic, tolerance);
        Assert.Equal((one.GetProperty("df1").GetDouble(), one.GetProperty("df2").GetDouble()), (found.Df!.Value, found.Df2!.Value));
        Near(one.GetProperty("p").GetDouble(), found.P, 20 * tolerance);
    }

    [Fact]
    public void A_residual_may_drift_when_its_unit_root_is_not_rejected()
    {
        var checks = Checks("money_demand", null);
        Assert.Equal(!checks["unit_root_residual"].Rejects, SerialCheckFigures.ResidualMayDrift(checks.Values));
        Assert.Equal(!checks["unit_root_residual"].Rejects, checks["unit_root_residual"].Contradicts);
        Assert.False(SerialCheckFigures.ResidualMayDrift(checks.Values.Where(check => check.Check != "unit_root_residual")));
    }

    private static void Near(double expected, double? actual, double relative) =>
        Assert.True(actual is double value && Math.Abs(value - expected) <= relative * Math.Max(1e-6, Math.Abs(expected)), $"expected {expected:R}, found {actual:R}");

    private static (JsonElement Expected, CheckResult Found, double Tolerance) Of(string name, string check, string key)
    {
        var one = ReferenceCases.Named(name);
        var cases = one.Values.GetProperty("residual_checks");
        return (cases.Optional(key) ?? cases, Checks(name, null)[check], one.Tolerance);
    }

    /// <param name="split">How many rows the first part has; null for no split.</param>
    private static Dictionary<string, CheckResult> Checks(string name, int? split) =>
        Kept.GetOrAdd((name, split), key => new Lazy<Dictionary<string, CheckResult>>(() => Make(key.Name, key.Split))).Value;

    private static Dictionary<string, CheckResult> Make(string name, int? split)
    {
        var path = ReferenceFiles.FullPath($"{name}/declaration.yaml");
        var inputs = AuditRunner.Inputs(
            File.ReadAllText(path), file => File.OpenRead(Path.Combine(Path.GetDirectoryName(path)!, file)), ReferenceFiles.ReadText("policy-reference.yaml")).Value!;
        var model = ModelBinder.Bind(inputs.Declaration, inputs.Table).Value!.Model;
        var selection = RowSelection.Of(model);
        var fits = ModelFits.Compute(model, selection, selection.Common, null, false, new RunSettings(1, 1, false));
        var rows = Enumerable.Range(0, fits.Common!.Rows.Count).ToArray();
        var fit = CheckedFits.Of(model, fits.Common, fits.Residuals, sampling: false);
        var serial = new SerialInputs(
            Numerics.ResidualChecks.SerialOrder.Of(rows), null, false, Deterministic.Constant, fits.Common.Final.Rank - 1, split is null ? null : [.. rows.Select(row => row >= split)], null);
        return CheckFigures.Of(fit, InfluenceSummary.Of(fit, 1), serial, fits.Common.Rows, 0.05, 1).ToDictionary(check => check.Check);
    }
}
