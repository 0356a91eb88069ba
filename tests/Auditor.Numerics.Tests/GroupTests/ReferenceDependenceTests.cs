using System.Globalization;
using System.Text.Json;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>Newey–West and CR1 of the cases in tests/reference (R sandwich 3.0.2; standard errors published with its vignettes).</summary>
public sealed class ReferenceDependenceTests
{
    [Theory]
    [InlineData("us_investment", 2, false)]
    [InlineData("us_consumption_lag", 2, true)]
    [InlineData("money_demand", 2, true)]
    public void Newey_West_of_every_group(string name, int groups, bool byRule)
    {
        var reference = new ReferenceFile(name);
        var tests = reference.Case.GetProperty("group_tests").EnumerateArray().ToArray();
        Assert.Equal(groups, tests.Length);
        for (var g = 0; g < groups; g++)
        {
            var wald = tests[g].GetProperty("newey_west_wald");
            var columns = reference.Terms(reference.Case.GetProperty("groups")[g].GetProperty("terms"));
            var periods = new RowClasses([.. Enumerable.Range(0, reference.Rows)], reference.Rows);
            var analysis = reference.Analyse(columns, new DependenceStructure { Period = periods });
            var lag = wald.GetProperty("bandwidth_lag").GetInt32();
            var estimate = NeweyWest.Of(analysis.Groups[0], analysis.Sums(0).Period!, byRule ? null : lag);
            Assert.Equal(lag, estimate.Lag);
            var expected = wald.GetProperty("adjust_true_times_n_over_n_minus_k");
            var test = Assert.IsType<FTest>(estimate.Test);
            // R's normal equations keep eight digits of us_consumption_lag's trend; see the next test.
            VectorFile.Near(expected.GetProperty("F").GetDouble(), test.Statistic, 2e-8);
            VectorFile.Near(expected.GetProperty("p").GetDouble(), test.P, 1e-7);
        }
    }

    /// <summary>us_consumption_lag in 60-digit arithmetic (mpmath: b = (X'X)^-1 X'y and the sums of Newey and West as written, lag 2).</summary>
    [Theory]
    [InlineData("con_lag1", 25.0022639535230694)]
    [InlineData("year", 27.5019768853052105)]
    public void Newey_West_in_60_digits(string column, double expected)
    {
        var reference = new ReferenceFile("us_consumption_lag");
        var periods = new RowClasses([.. Enumerable.Range(0, reference.Rows)], reference.Rows);
        var analysis = reference.Analyse([reference.Column(column)], new DependenceStructure { Period = periods });
        VectorFile.Near(expected, Assert.IsType<FTest>(NeweyWest.Of(analysis.Groups[0], analysis.Sums(0).Period!).Test).Statistic, 1e-11);
    }

    [Fact]
    public void Cr1_of_the_year_effects_by_firm()
    {
        var reference = new ReferenceFile("petersen_panel");
        var year = reference.Column("year");
        double[][] dummies = [.. Enumerable.Range(2, 9).Select(level => year.Select(value => value == level ? 1.0 : 0).ToArray())];
        var analysis = reference.Analyse(dummies, new DependenceStructure { Cluster = reference.Classes("firm") });
        var expected = reference.Case.GetProperty("group_tests")[0].GetProperty("cluster_wald_CR1");
        var test = Assert.IsType<FTest>(Cr1.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Assert.Equal(expected.GetProperty("clusters").GetInt32(), analysis.Sums(0).Cluster!.Count);
        VectorFile.Near(expected.GetProperty("F").GetDouble(), test.Statistic);
        VectorFile.Near(expected.GetProperty("p_with_clusters_minus_1_df").GetDouble(), test.P);
    }

    /// <summary>The standard error of x by firm, published as 0.050596 in sandwich's vignette: F of x added to the constant is (b/se)².</summary>
    [Fact]
    public void Cr1_standard_error_as_published()
    {
        var reference = new ReferenceFile("petersen_panel");
        var analysis = new GroupAnalysis(
            new MatrixDesign(true, [], [[reference.Column("x")]], reference.Column("y")), new DependenceStructure { Cluster = reference.Classes("firm") });
        var b = reference.Case.GetProperty("final_model").GetProperty("coefficients")[1].GetProperty("estimate").GetDouble();
        var test = Assert.IsType<FTest>(Cr1.Of(analysis.Groups[0], analysis.Sums(0).Cluster!));
        Assert.Equal(0.050596, Math.Round(b / Math.Sqrt(test.Statistic), 6));
    }

    private sealed class ReferenceFile
    {
        private readonly string[] _names;
        private readonly double[][] _rows;

        public ReferenceFile(string name)
        {
            var folder = Path.Combine(AppContext.BaseDirectory, "reference", name);
            Case = JsonDocument.Parse(File.ReadAllText(Path.Combine(folder, "case.json"))).RootElement;
            var lines = File.ReadAllLines(Path.Combine(folder, "data.csv"));
            _names = lines[0].Split(',');
            _rows = [.. lines[1..].Select(line => line.Split(',')).Where(cells => Array.TrueForAll(cells, cell => cell.Length > 0)).Select(Numbers)];
            Assert.Equal(Case.GetProperty("n_used").GetInt32(), _rows.Length);
        }

        public JsonElement Case { get; }

        public int Rows => _rows.Length;

        public double[] Column(string name) => [.. _rows.Select(row => row[Array.IndexOf(_names, name)])];

        public RowClasses Classes(string name) => RowClasses.Ranked([.. Column(name).Select(value => (int)value)]);

        public double[][] Terms(JsonElement terms) => [.. terms.EnumerateArray().Select(term => Column(term.GetString()!))];

        public GroupAnalysis Analyse(double[][] group, DependenceStructure structure) => new(
            new MatrixDesign(true, Terms(Case.GetProperty("final_terms")), [group], Column(Case.GetProperty("response").GetString()!)), structure);

        private static double[] Numbers(string[] cells) =>
            [.. cells.Select(cell => double.TryParse(cell, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) ? value : double.NaN)];
    }
}
