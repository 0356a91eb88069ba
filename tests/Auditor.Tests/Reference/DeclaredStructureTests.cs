using System.Text.Json;

namespace Auditor.Tests.Reference;

/// <summary>
/// Reference cases whose cluster, order and split are declared, as an author would: the record then holds what R's sandwich, lmtest and a second route computed for
/// them (case.json: cluster_wald_CR1 on G - 1 degrees of freedom, newey_west_wald with adjust_true, durbin_watson, breusch_godfrey, ljung_box, chow_test).
/// </summary>
public sealed class DeclaredStructureTests
{
    private const double Tolerance = 1e-7;

    [Fact]
    public void A_declared_cluster_gives_the_reference_values_of_CR1()
    {
        var record = Run("petersen_panel", "cluster: firm");
        var expected = Case("petersen_panel").GetProperty("group_tests")[0].GetProperty("cluster_wald_CR1");
        var group = record.GetProperty("exclusions")[0];
        var cr1 = group.GetProperty("tests").GetProperty("cr1");

        Close(expected.GetProperty("F"), cr1.GetProperty("f"));
        Close(expected.GetProperty("p_with_clusters_minus_1_df"), cr1.GetProperty("p"));
        Assert.Equal(499, cr1.GetProperty("df2").GetDouble());
        Assert.Equal("cluster", group.GetProperty("basis").GetString());
        Assert.Equal("row", group.GetProperty("level").GetString());
        Assert.Equal("clusters", group.GetProperty("power").GetProperty("counted_in").GetString());
    }

    [Theory]
    [InlineData("us_investment", 11)]
    [InlineData("money_demand", 34)]
    [InlineData("us_consumption_lag", 11)]
    public void A_declared_order_and_split_give_the_reference_values(string name, int split)
    {
        var expected = Case(name);
        var lag = expected.GetProperty("group_tests")[0].GetProperty("newey_west_wald").GetProperty("bandwidth_lag").GetInt32();
        var record = Run(name, "time: {file_order: true}", $"serial_lag: {lag}", $"split: {{row: {split}}}");
        var tests = expected.GetProperty("group_tests").EnumerateArray().ToArray();
        Assert.Equal(tests.Length, record.GetProperty("exclusions").GetArrayLength());
        foreach (var (test, group) in tests.Zip(record.GetProperty("exclusions").EnumerateArray()))
        {
            var adjusted = test.GetProperty("newey_west_wald").GetProperty("adjust_true_times_n_over_n_minus_k");
            Close(adjusted.GetProperty("F"), group.GetProperty("tests").GetProperty("newey_west").GetProperty("f"));
            Close(adjusted.GetProperty("p"), group.GetProperty("tests").GetProperty("newey_west").GetProperty("p"));
            Assert.Equal("time", group.GetProperty("basis").GetString());
        }

        var checks = expected.GetProperty("residual_checks");
        Close(checks.GetProperty("durbin_watson").GetProperty("d"), Statistic(record, "durbin_watson"));
        Close(checks.GetProperty("breusch_godfrey_order_1").GetProperty("chi_square_form").GetProperty("statistic"), Statistic(record, "breusch_godfrey_1"));
        Close(checks.GetProperty("breusch_godfrey_order_4").GetProperty("chi_square_form").GetProperty("statistic"), Statistic(record, "breusch_godfrey_4"));
        Close(checks.GetProperty("ljung_box_lag_4").GetProperty("statistic"), Statistic(record, "ljung_box_4"));
        Close(expected.GetProperty("chow_test").GetProperty("F"), Statistic(record, "chow"));
    }

    /// <summary>Two unrelated random walks (seed fixed): the residual's unit root is not rejected, and a group that is no change gets no verdict from its tests.</summary>
    [Fact]
    public void A_residual_that_may_drift_leaves_its_groups_inconclusive()
    {
        var record = AuditRunner.Record(Walks("walk", "{change: {of: walk, by: 1}}"), _ => new MemoryStream(System.Text.Encoding.UTF8.GetBytes(WalkData())));
        var root = record.Checks.Single(check => check.Check == "unit_root_residual");

        Assert.False(root.Rejects);
        Assert.Equal("inconclusive", record.Exclusions.Single(exclusion => exclusion.Group == "level").Verdict);
        Assert.Contains("drift", record.Exclusions.Single(exclusion => exclusion.Group == "level").Reason, StringComparison.Ordinal);
        Assert.DoesNotContain("drift", record.Exclusions.Single(exclusion => exclusion.Group == "change").Reason, StringComparison.Ordinal);
    }

    private static string Walks(string level, string change) => $"""
        audit: 1
        model: {"{id: walks, version: \"1\"}"}
        data:
          source: walks.csv
          time: {"{file_order: true}"}
        response: y
        final_model: {"{terms: [x]}"}
        left_out:
          - group: level
            terms: [{level}]
          - group: change
            terms: [{change}]
        """;

    private static string WalkData()
    {
        var random = new Numerics.Random.Generator(20261201);
        var (text, y, x, walk) = (new System.Text.StringBuilder("y,x,walk\n"), 0.0, 0.0, 0.0);
        for (var row = 0; row < 120; row++)
        {
            (y, x, walk) = (y + random.Uniform() - 0.5, x + random.Uniform() - 0.5, walk + random.Uniform() - 0.5);
            text.Append(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{y},{x},{walk}\n"));
        }

        return text.ToString();
    }

    /// <summary>The case's own declaration with lines added under <c>data</c>, on the rows of the reference.</summary>
    private static JsonElement Run(string name, params string[] structure)
    {
        var path = ReferenceFiles.FullPath($"{name}/declaration.yaml");
        var lines = string.Concat(structure.Select(line => "\n  " + line));
        var text = File.ReadAllText(path).Replace("  source: data.csv", "  source: data.csv" + lines, StringComparison.Ordinal);
        var record = AuditRunner.Record(text, file => File.OpenRead(Path.Combine(Path.GetDirectoryName(path)!, file)), ReferenceFiles.ReadText("policy-reference.yaml"));
        return JsonDocument.Parse(Auditor.Reporting.JsonRecord.Write(record)).RootElement;
    }

    private static JsonElement Case(string name) => JsonDocument.Parse(ReferenceFiles.ReadText($"{name}/case.json")).RootElement;

    private static JsonElement Statistic(JsonElement record, string check) =>
        record.GetProperty("checks").EnumerateArray().Single(one => one.GetProperty("check").GetString() == check).GetProperty("statistic");

    private static void Close(JsonElement expected, JsonElement actual) =>
        Assert.InRange(actual.GetDouble() / expected.GetDouble(), 1 - Tolerance, 1 + Tolerance);
}
