using System.Text.Json;
using Auditor.Numerics.Elimination;
using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Tests.Elimination;

/// <summary>tests/vectors/selective_p.json: five candidates, forty rows, two rules.</summary>
public sealed class WorkedCaseTests
{
    private static readonly VectorFile File = new("selective_p");

    public static TheoryData<string, string> Groups => new()
    {
        { "drop_above_0.05", "b" }, { "drop_above_0.05", "c" }, { "drop_above_0.05", "e" }, { "aic", "b" }, { "aic", "c" }, { "aic", "e" },
    };

    [Theory]
    [MemberData(nameof(Groups))]
    public void Selective_p_and_its_event(string rule, string group)
    {
        var expected = File.Outputs.GetProperty(rule).GetProperty("left_out").GetProperty(group);
        var (one, at) = (Case(), Array.IndexOf(["b", "c", "e"], group));
        var partial = Assert.IsType<FTest>(PartialF.Of(one.Groups[at]));
        VectorFile.Near(expected.GetProperty("classical_p").GetDouble(), partial.P);
        Assert.Equal((expected.GetProperty("df1").GetDouble(), expected.GetProperty("df2").GetDouble()), (partial.Df1, partial.Df2));

        var selective = Assert.IsType<SelectiveTest>(one.Selective(at, Rule(rule)));
        VectorFile.Near(expected.GetProperty("theta_observed").GetDouble(), selective.Theta);
        VectorFile.Near(expected.GetProperty("selective_p").GetDouble(), selective.Probability);
        VectorFile.Near(Math.Log(expected.GetProperty("selective_p").GetDouble()), selective.LogP);
        AssertEvent(expected, selective);
    }

    /// <summary>20,000 draws of theta by the other implementation: shares within four of their standard errors.</summary>
    [Theory]
    [MemberData(nameof(Groups))]
    public void The_draws_of_the_other_implementation_agree(string rule, string group)
    {
        var expected = File.Outputs.GetProperty(rule).GetProperty("left_out").GetProperty(group);
        var selective = Assert.IsType<SelectiveTest>(Case().Selective(Array.IndexOf(["b", "c", "e"], group), Rule(rule)));
        var inEvent = expected.GetProperty("monte_carlo_draws_in_event").GetDouble();
        Within(expected.GetProperty("monte_carlo_check").GetDouble(), selective.Probability, inEvent);
        Within(inEvent / 20000, selective.Selection, 20000);
    }

    [Theory]
    [InlineData("drop_above_0.05")]
    [InlineData("aic")]
    public void The_rule_ends_in_the_same_model(string rule)
    {
        var names = File.Outputs.GetProperty(rule).GetProperty("final_model_groups").EnumerateArray().Select(name => name.GetString());
        Assert.Equal(["a", "d"], names);
        Assert.True(Case().Path(Rule(rule)).EndsInReported);
    }

    private static EliminationCase Case()
    {
        double[][] Columns(string name) => [.. File.Inputs.GetProperty("groups").GetProperty(name).EnumerateArray().Select(VectorFile.Doubles)];
        var design = new MatrixDesign(true, [.. Columns("a"), .. Columns("d")], [Columns("b"), Columns("c"), Columns("e")], File.Input("y"));
        return new EliminationCase(design, forced: 1);
    }

    private static DroppingRule Rule(string name) => name == "aic" ? new(DroppingCriterion.Aic, 0) : new(DroppingCriterion.PartialF, 0.05);

    private static void AssertEvent(JsonElement expected, SelectiveTest selective)
    {
        double[][] intervals = [.. expected.GetProperty("event_intervals_of_theta").EnumerateArray().Select(VectorFile.Doubles)];
        Assert.Equal(intervals.Length, selective.Event.Count);
        foreach (var (interval, found) in intervals.Zip(selective.Event))
        {
            VectorFile.Near(interval[0], Math.Atan(found.From));
            VectorFile.Near(interval[1], Math.Atan(found.To));
        }
    }

    private static void Within(double share, double probability, double draws) =>
        Assert.InRange(share - probability, -4 * Math.Sqrt(probability * (1 - probability) / draws), 4 * Math.Sqrt(probability * (1 - probability) / draws));
}
