using System.Globalization;
using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Variance proportions by condition index (Belsley, Kuh and Welsch 1980), where the case gives them: 12 columns or fewer.</summary>
internal static class VarianceProportionFigures
{
    /// <summary>Proportions near zero are compared relative to this: singular vectors carry absolute rounding.</summary>
    private const double NearZero = 1e-3;

    public static IEnumerable<Figure> Of(CaseRun run)
    {
        JsonElement fit = run.Case.Values.GetProperty("collinearity").GetProperty(run.FitName);
        return !fit.TryGetProperty("variance_decomposition_proportions", out JsonElement expected) || expected.ValueKind != JsonValueKind.Array
            ? []
            : expected.EnumerateArray().Where(one => !IsTied(expected, one)).Zip(run.Record.Collinearity.GetProperty("variance_proportions").EnumerateArray().Where((_, i) => !IsTied(expected, expected[i]))).SelectMany((pair, i) => Of(run, i, pair.First, pair.Second));
    }

    /// <summary>Equal condition indices share their proportions in no one way: any rotation among them is as right.</summary>
    private static bool IsTied(JsonElement all, JsonElement one) =>
        all.EnumerateArray().Count(other => Math.Abs(other.GetProperty("condition_index").GetDouble() - one.GetProperty("condition_index").GetDouble()) < 1e-6) > 1;

    private static IEnumerable<Figure> Of(CaseRun run, int index, JsonElement expected, JsonElement actual)
    {
        foreach (JsonProperty column in expected.GetProperty("proportions").EnumerateObject())
        {
            string label = run.Label(column.Name);
            Quantity? found = actual.GetProperty("proportions").TryGetProperty(label, out JsonElement value) ? new Quantity(value.GetDouble()) : null;
            yield return new Figure("variance proportion", string.Create(CultureInfo.InvariantCulture, $"{label}, index {index + 1}"), new Quantity(column.Value.GetDouble()), null, found, NearZero);
        }
    }
}
