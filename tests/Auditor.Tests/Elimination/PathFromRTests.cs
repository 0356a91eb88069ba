using System.Text.Json;
using Auditor.Reporting;
using Auditor.SelfTest;
using Auditor.Tests.Reference;

namespace Auditor.Tests.Elimination;

/// <summary>Paths of elimination by R's step and drop1 on four public datasets (values/make_values.R), five rules each.</summary>
public sealed class PathFromRTests
{
    private const double Tolerance = 1e-9;
    private static readonly JsonElement Values = Read();

    public static TheoryData<int> Rows => [.. Enumerable.Range(0, Values.GetArrayLength())];

    [Theory]
    [MemberData(nameof(Rows))]
    public void The_rule_takes_the_path_of_R_and_ends_where_R_ends(int row)
    {
        var record = Run(Values[row], []);
        var found = record.EliminationByRule!;
        var expected = Values[row].GetProperty("drops").EnumerateArray().ToList();
        Assert.Equal(Values[row].GetProperty("n").GetInt32(), found.Rows);
        Assert.True(found.EndsInReportedModel);
        Assert.Equal(expected.Select(drop => drop.Text("drop")), found.Drops.Select(drop => drop.Drop));
        Assert.Equal(Texts(Values[row], "kept"), found.Kept);
        Assert.All(expected.Zip(found.Drops), pair => AssertSame(pair.First, pair.Second.F, pair.Second.Df1, pair.Second.Df2, pair.Second.P));
        Assert.All(expected.Zip(found.Drops), pair => Near(pair.First, "change", pair.Second.CriterionChange));
        Assert.All(record.Exclusions, group => Assert.InRange(group.Selective.P!.Value, 0, 1));
    }

    [Theory]
    [MemberData(nameof(Rows))]
    public void Steps_in_the_order_of_R_keep_the_rule_and_give_its_figures(int row)
    {
        var expected = Values[row].GetProperty("drops").EnumerateArray().ToList();
        var steps = Run(Values[row], [.. expected.Select(drop => drop.Text("drop"))]).Elimination;
        Assert.Equal(expected.Count, steps.Count);
        Assert.All(steps, step => Assert.False(step.BreaksRule));
        Assert.All(expected.Zip(steps), pair => AssertSame(pair.First, pair.Second.F, pair.Second.Df1, pair.Second.Df2, pair.Second.P));
    }

    [Fact]
    public void Steps_in_another_order_break_the_rule_where_they_leave_it()
    {
        var row = Values.EnumerateArray().First(one => one.GetProperty("drops").GetArrayLength() == 3);
        string[] order = [.. row.GetProperty("drops").EnumerateArray().Select(drop => drop.Text("drop"))];
        var steps = Run(row, [order[0], order[2], order[1]]).Elimination;
        Assert.Equal([false, true, false], steps.Select(step => step.BreaksRule));
        Assert.StartsWith(order[1] + " has a larger p here: ", steps[1].BreaksBecause, StringComparison.Ordinal);
    }

    /// <summary>What R kept is the final model, every term that R dropped a left-out group of that name.</summary>
    private static AuditRecord Run(JsonElement row, IReadOnlyList<string> steps)
    {
        var kept = Texts(row, "kept");
        var groups = Texts(row, "terms").Except(kept).Select(term => $"  - {{group: {term}, terms: [{term}]}}\n");
        var declaration =
            "audit: 1\nmodel: {id: path}\ndata: {source: data.csv}\nresponse: " + row.Text("response") + "\nfinal_model: {terms: [" + string.Join(", ", kept) + "]}\n"
            + "left_out:" + (groups.Any() ? "\n" + string.Concat(groups) : " []\n")
            + "elimination:\n  rule: " + row.Text("rule") + "\n  steps: [" + string.Join(", ", steps.Select(step => $"{{drop: {step}}}")) + "]\n";
        return AuditRunner.Record(declaration, _ => File.OpenRead(ReferenceFiles.FullPath(row.Text("case") + "/data.csv")));
    }

    private static void AssertSame(JsonElement expected, double? f, double? df1, double? df2, double? p)
    {
        Near(expected, "f", f);
        Near(expected, "df1", df1);
        Near(expected, "df2", df2);
        Near(expected, "p", p);
    }

    private static void Near(JsonElement expected, string name, double? actual)
    {
        if (expected.GetProperty(name).ValueKind == JsonValueKind.Null)
        {
            Assert.Null(actual);
            return;
        }

        var value = expected.GetProperty(name).GetDouble();
        Assert.True(Math.Abs(value - actual!.Value) <= Tolerance * Math.Abs(value), $"{name}: expected {value:R}, found {actual:R}");
    }

    private static string[] Texts(JsonElement row, string name) => [.. row.GetProperty(name).EnumerateArray().Select(text => text.GetString()!)];

    private static JsonElement Read()
    {
        using var document = JsonDocument.Parse(File.ReadAllText(Path.Combine(TestFolders.Root, "tests", "Auditor.Tests", "Elimination", "values", "values.json")));
        return document.RootElement.Clone();
    }
}
