using System.Text.Json;
using Auditor.SelfTest;
using Auditor.Tests.Reference;

namespace Auditor.Tests.Demo;

/// <summary>
/// The demo shows each kind of verdict once, and its figures are those of numpy and scipy (demo_values.py, which computes them from the
/// formulas and the data alone, and demo_values.json, which it wrote).
/// </summary>
public sealed class DemoTests
{
    private const double Tolerance = 1e-8;
    private static readonly Lazy<RecordView> Record = new(() => new RecordView(AuditRunner.Run(Path.Combine(TestFolders.Demo, "declaration.yaml"), "").RootElement));
    private static readonly Lazy<JsonElement> Values = new(ReadValues);

    public static TheoryData<string> Groups => [.. Values.Value.EnumerateArray().Select(group => group.Text("group"))];

    [Theory]
    [MemberData(nameof(Groups))]
    public void The_figures_are_those_of_another_program(string group)
    {
        JsonElement expected = Values.Value.Find("group", group)!.Value;
        Report.AssertAllHold([.. Figures(expected, Record.Value.Exclusion(group))], Tolerance);
    }

    [Theory]
    [InlineData("wear", "not_supported", "shown_material")]
    [InlineData("steep ground", "inconclusive", "not_shown")]
    [InlineData("running gear", "inconclusive", "not_shown")]
    [InlineData("delivery distance", "supported", "shown_negligible")]
    [InlineData("quarter of return", "supported", "shown_negligible")]
    [InlineData("dealer size", "not_supported", "shown_negligible")]
    public void Each_group_has_the_verdict_it_was_made_for(string group, string verdict, string materiality)
    {
        JsonElement expected = Values.Value.Find("group", group)!.Value;
        JsonElement actual = Record.Value.Exclusion(group);
        Assert.Equal((verdict, materiality), (expected.Text("verdict"), expected.Text("materiality")));
        Assert.Equal((verdict, materiality), (actual.Text("verdict"), actual.Text("materiality")));
    }

    [Fact]
    public void The_copy_of_a_kept_column_cannot_be_tested()
    {
        JsonElement actual = Record.Value.Exclusion("lease years");
        Assert.Equal("untestable", actual.Text("verdict"));
        Assert.Equal(["term_years"], RecordView.Aliased(actual));
    }

    [Fact]
    public void No_single_t_gives_the_wear_away()
    {
        JsonElement wear = Values.Value.Find("group", "wear")!.Value;
        Assert.InRange(wear.Number("largest_t")!.Value.Number, 0, 1.6);
        Assert.InRange(wear.Number("hc3_p")!.Value.Number, 0, 1e-9);
    }

    private static IEnumerable<Figure> Figures(JsonElement expected, JsonElement actual)
    {
        JsonElement? classical = RecordView.Test(actual, "classical");
        JsonElement? hc3 = RecordView.Test(actual, "hc3");
        JsonElement share = actual.GetProperty("partial_r_squared");
        JsonElement negligible = actual.GetProperty("negligible");
        yield return Figure("rows", expected, actual.Number("rows"));
        yield return Figure("df1", expected, actual.Number("df1"));
        yield return Figure("df2", expected, actual.Number("df2"));
        yield return Figure("classical_f", expected, classical.Number("f"));
        yield return Figure("classical_p", expected, classical.Number("p"));
        yield return Figure("hc3_f", expected, hc3.Number("f"));
        yield return Figure("hc3_p", expected, hc3.Number("p"));
        yield return Figure("p_adjusted", expected, actual.Number("p_adjusted"));
        yield return Figure("partial_r_squared", expected, share.Number("estimate"));
        yield return Figure("basis_lower", expected, share.Number("basis_lower"));
        yield return Figure("basis_upper", expected, share.Number("basis_upper"));
        yield return Figure("effective_rows", expected, actual.Number("effective_rows"));
        yield return Figure("negligible_p", expected, negligible.Number("p"));
        yield return Figure("negligible_p_adjusted", expected, negligible.Number("p_adjusted"));
    }

    private static Figure Figure(string name, JsonElement expected, Quantity? actual) =>
        new(name, expected.Text("group"), expected.Number(name), null, actual, name.StartsWith("basis_", StringComparison.Ordinal) ? Scales.Share : 0);

    private static JsonElement ReadValues()
    {
        using JsonDocument document = JsonDocument.Parse(File.ReadAllText(Path.Combine(TestFolders.Root, "tests", "Auditor.Tests", "Demo", "demo_values.json")));
        return document.RootElement.Clone();
    }
}
