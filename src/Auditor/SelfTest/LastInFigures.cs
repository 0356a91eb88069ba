using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>A group given everything else tried: last into the largest model, and its own sum of squares over the largest model's mean square.</summary>
internal static class LastInFigures
{
    public static IEnumerable<Figure> Of(CaseRun run, JsonElement group, JsonElement actual)
    {
        string name = group.Text("group");
        JsonElement expected = run.Case.Values.GetProperty("group_tests_within_largest_model").Find("group", name)!.Value;
        return LastIn(name, expected, RecordView.Test(actual, "last_in")).Concat(LargestDenominator(run, group, RecordView.Test(actual, "largest_model_denominator")));
    }

    private static IEnumerable<Figure> LastIn(string name, JsonElement expected, JsonElement? actual)
    {
        if (expected.Number("F") is null)
        {
            return [];
        }

        return
        [
            new Figure("last_in f", name, expected.Number("F"), null, actual.Number("f"), Scales.Share),
            new Figure("last_in df1", name, expected.Number("df1"), null, actual.Number("df1")),
            new Figure("last_in df2", name, expected.Number("df2"), null, actual.Number("df2")),
            new Figure("last_in p", name, expected.Number("p", "log10_p"), null, actual.Number("p", "log10_p")),
        ];
    }

    private static IEnumerable<Figure> LargestDenominator(CaseRun run, JsonElement group, JsonElement? actual)
    {
        JsonElement largest = run.Case.Values.GetProperty("largest_model");
        if (group.Number("F") is not { } f || largest.GetProperty("perfect_fit").GetBoolean())
        {
            yield break;
        }

        string name = group.Text("group");
        yield return new Figure("largest_model_denominator f", name, Rescaled(group, f, largest), null, actual.Number("f"), Scales.Share);
        yield return new Figure("largest_model_denominator df1", name, group.Number("df1"), null, actual.Number("df1"));
        yield return new Figure("largest_model_denominator df2", name, largest.Number("df_resid"), null, actual.Number("df2"));
        if (LastStep(run, name) is { } step)
        {
            yield return new Figure("largest_model_denominator p", name, step.Number("p", "log10_p"), null, actual.Number("p", "log10_p"));
        }
    }

    /// <summary>The group's mean square (its F times its own residual mean square, so that nothing cancels) over the largest model's.</summary>
    private static Quantity Rescaled(JsonElement group, Quantity f, JsonElement largest)
    {
        double own = group.Number("rss_full")!.Value.Number / group.Number("df2")!.Value.Number;
        double whole = largest.Number("rss")!.Value.Number / largest.Number("df_resid")!.Value.Number;
        return new Quantity(f.Number * own / whole);
    }

    /// <summary>The last group to be dropped along the path leaves the final model: there the path's test is the group's own numerator.</summary>
    private static JsonElement? LastStep(CaseRun run, string name)
    {
        JsonElement step = run.Case.Values.GetProperty("sequential_path").EnumerateArray().Last();
        return step.Text("dropped") == name ? step.Optional("with_largest_model_mean_square") : null;
    }
}
