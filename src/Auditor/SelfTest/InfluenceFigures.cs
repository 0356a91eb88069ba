using System.Globalization;
using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>
/// Influence of the final model's rows: R's influence measures, 100-digit arithmetic where the case has it, and the largest studentised residual.
/// AGREEMENT.md: values near zero relative to one millionth.
/// </summary>
internal static class InfluenceFigures
{
    /// <summary>Nothing for a largest model or a perfect fit: the cases hold the rows of the final one.</summary>
    public static IEnumerable<Figure> Of(CaseRun run)
    {
        JsonElement expected = run.Case.Values.GetProperty("influence");
        return run.IsLargest || expected.Optional("not_computed") is not null
            ? []
            : expected.GetProperty("top_10_rows_by_cooks_distance").EnumerateArray().SelectMany(row => Row(run, row)).Concat(Largest(run, expected));
    }

    private static IEnumerable<Figure> Row(CaseRun run, JsonElement row)
    {
        int number = row.GetProperty("row").GetInt32();
        JsonElement? actual = run.Record.Influence.GetProperty("largest").EnumerateArray()
            .Where(one => one.GetProperty("row").GetInt32() == number).Select(one => (JsonElement?)one).FirstOrDefault();
        Figure One(string field, string name, string? exact) => new(
            "influence " + field,
            number.ToString(CultureInfo.InvariantCulture),
            row.Number(name),
            exact is null ? null : Exact(run, exact, number),
            actual.Number(field),
            Scales.Share);
        yield return One("leverage", "leverage", "leverage");
        yield return One("studentised_residual", "externally_studentised_residual", "externally_studentised_residual");
        yield return One("cooks_distance", "cooks_distance", "cooks_distance");
        yield return One("dffits", "dffits", null);
    }

    private static IEnumerable<Figure> Largest(CaseRun run, JsonElement influence)
    {
        JsonElement expected = influence.GetProperty("largest_externally_studentised_residual");
        JsonElement? actual = run.Record.Checks.Find("check", "largest_residual");
        Quantity? exact = Exact(run, "externally_studentised_residual", expected.GetProperty("row").GetInt32());
        yield return new Figure("largest_residual", "", expected.Number("value"), exact, actual.Number("statistic"));
        yield return new Figure("largest_residual row", "", expected.Number("row"), null, actual.Number("row"));
        yield return new Figure("largest_residual df", "", expected.Number("df"), null, actual.Number("df"));
        yield return new Figure("largest_residual p", "", expected.Number("p_bonferroni"), null, actual.Number("p"));
    }

    /// <summary>exact.json lists the rows used, in order; the case numbers the rows of the file.</summary>
    private static Quantity? Exact(CaseRun run, string list, int row)
    {
        int dropped = run.Case.Values.GetProperty("rows_dropped_for_missing_values").EnumerateArray().Count(other => other.GetInt32() < row);
        return run.Case.Exact.Optional("influence").Optional(list) is { } values ? Quantity.Parse(values[row - 1 - dropped].GetString()!) : null;
    }
}
