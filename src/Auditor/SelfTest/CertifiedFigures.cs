using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>The values certified by NIST (Statistical Reference Datasets, linear least squares), as printed in case.json.</summary>
internal static class CertifiedFigures
{
    private static readonly Dictionary<string, string> FitNames = new()
    {
        ["residual standard deviation"] = "sigma",
        ["R squared"] = "r_squared",
        ["overall F"] = "f",
        ["residual sum of squares"] = "rss",
    };

    /// <param name="run">A run whose final model is the certified one.</param>
    public static IEnumerable<Figure> Of(CaseRun run) => run.Case.Values.GetProperty("published_values").EnumerateArray()
        .Select(line => Of(run, line.Text("what"), Quantity.Parse(line.Text("published"))));

    private static Figure Of(CaseRun run, string what, Quantity published) =>
        Column(what, "coefficient ") is { } estimated ? Coefficient(run, estimated, "estimate", published)
        : Column(what, "standard error ") is { } spread ? Coefficient(run, spread, "standard_error", published)
        : new Figure("certified " + FitNames[what], "", null, published, run.Record.FinalFit.Number(FitNames[what]));

    private static string? Column(string what, string start) => what.StartsWith(start, StringComparison.Ordinal) ? what[start.Length..] : null;

    private static Figure Coefficient(CaseRun run, string column, string field, Quantity published)
    {
        JsonElement? found = run.Record.Coefficient(run.Label(column));
        return new Figure("certified " + field, column, null, published, found.Number(field));
    }
}
