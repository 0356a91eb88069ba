using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>p-values adjusted over the groups; groups that cannot be tested are not part of the family.</summary>
internal static class AdjustmentFigures
{
    public static IEnumerable<Figure> Of(CaseRun run, string adjustment)
    {
        JsonElement adjusted = run.Case.Values.GetProperty("adjusted_p_values");
        IReadOnlyList<string> groups = adjusted.Texts("over");
        return groups.SelectMany((group, i) => Of(run, group, At(adjusted, "raw", i), At(adjusted, adjustment, i)));
    }

    private static IEnumerable<Figure> Of(CaseRun run, string group, Quantity raw, Quantity adjusted)
    {
        JsonElement actual = run.Record.Exclusion(group);
        Assert.Equal("classical", actual.Text("basis"));
        yield return new Figure("basis p", group, raw, null, actual.Number("p", "log10_p"));
        yield return new Figure("p_adjusted", group, adjusted, null, actual.Number("p_adjusted", "log10_p_adjusted"));
    }

    private static Quantity At(JsonElement adjusted, string list, int i) => new(adjusted.GetProperty(list)[i].GetDouble());
}
