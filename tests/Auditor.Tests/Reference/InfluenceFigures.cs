using System.Globalization;
using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Influence of the final model's rows: R's influence measures, the ten largest by Cook's distance, and the largest studentised residual.</summary>
internal static class InfluenceFigures
{
    /// <summary>AGREEMENT.md: values near zero relative to this.</summary>
    private const double NearZero = 1e-6;

    public static IEnumerable<Figure> Of(CaseRun run)
    {
        JsonElement expected = run.Case.Values.GetProperty("influence");
        List<JsonElement> found = [.. run.Record.Influence.GetProperty("largest").EnumerateArray()];
        foreach (JsonElement row in expected.GetProperty("top_10_rows_by_cooks_distance").EnumerateArray())
        {
            int number = row.GetProperty("row").GetInt32();
            JsonElement? actual = found.Where(one => one.GetProperty("row").GetInt32() == number).Select(one => (JsonElement?)one).FirstOrDefault();
            string where = number.ToString(CultureInfo.InvariantCulture);
            yield return new Figure("leverage", where, row.Number("leverage"), null, actual.Number("leverage"), NearZero);
            yield return new Figure("studentised_residual", where, row.Number("externally_studentised_residual"), null, actual.Number("studentised_residual"), NearZero);
            yield return new Figure("cooks_distance", where, row.Number("cooks_distance"), null, actual.Number("cooks_distance"), NearZero);
            yield return new Figure("dffits", where, row.Number("dffits"), null, actual.Number("dffits"), NearZero);
        }

        JsonElement largest = expected.GetProperty("largest_externally_studentised_residual");
        JsonElement? check = run.Record.Checks.Find("check", "largest_residual");
        yield return new Figure("largest_residual", "value", largest.Number("value"), null, check.Number("statistic"));
        yield return new Figure("largest_residual row", "", largest.Number("row"), null, check.Number("row"));
        yield return new Figure("largest_residual p", "", largest.Number("p_bonferroni"), null, check.Number("p"));
    }
}
