using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Generalised variance inflation of every term (Fox and Monette 1992), where R's car computes it and terms are declared column by column.</summary>
internal static class VarianceInflationFigures
{
    public static IEnumerable<Figure> Of(CaseRun run)
    {
        JsonElement expected = run.Case.Values.GetProperty("collinearity").GetProperty(run.FitName).GetProperty("vif");
        return run.Variant.Contains("-powers", StringComparison.Ordinal) || expected.ValueKind != JsonValueKind.Array
            ? []
            : expected.EnumerateArray().SelectMany(term => Of(run, term));
    }

    private static IEnumerable<Figure> Of(CaseRun run, JsonElement expected)
    {
        string label = run.Label(expected.Text("term"));
        JsonElement? actual = run.Record.Collinearity.GetProperty("terms").Find("term", label);
        yield return new Figure("gvif df", label, expected.Number("df"), null, actual.Number("df"));
        yield return new Figure("gvif", label, expected.Number("generalised_vif"), null, actual.Number("gvif"));
        yield return new Figure("gvif_scaled", label, expected.Number("generalised_vif_to_1_over_2df"), null, actual.Number("gvif_scaled"));
    }
}
