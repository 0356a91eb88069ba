using System.Globalization;
using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>What the noncentral F gives: the classical interval of partial R² at 90 per cent, and power at an effect.</summary>
internal static class EffectFigures
{
    public static IEnumerable<Figure> Intervals(CaseRun run) => Tested(run).SelectMany(pair => Interval(pair.Name, pair.Expected, pair.Actual));

    /// <param name="fSquared">Cohen's f² of the effect; the policy's bound on partial R² is f²/(1 + f²).</param>
    public static IEnumerable<Figure> Power(CaseRun run, double fSquared) => Tested(run).Select(pair => PowerAt(pair.Name, pair.Expected, pair.Actual, fSquared));

    public static string PolicyLine(double fSquared) =>
        string.Create(CultureInfo.InvariantCulture, $"negligible_partial_r_squared: {fSquared / (1 + fSquared):R}");

    private static IEnumerable<(string Name, JsonElement Expected, JsonElement Actual)> Tested(CaseRun run) => run.Case.Groups
        .Where(group => group.Optional("noncentrality").Optional("confidence_90") is not null)
        .Select(group => (group.Text("group"), group, run.Record.Exclusion(group.Text("group"))));

    private static IEnumerable<Figure> Interval(string name, JsonElement expected, JsonElement actual)
    {
        JsonElement limits = expected.GetProperty("noncentrality").GetProperty("confidence_90");
        JsonElement found = actual.GetProperty("partial_r_squared");
        yield return new Figure("partial_r_squared lower", name, limits.Number("partial_r2_lower"), null, found.Number("lower"), Scales.Share);
        yield return new Figure("partial_r_squared upper", name, limits.Number("partial_r2_upper"), null, found.Number("upper"), Scales.Share);
        Quantity? rows = expected.GetProperty("noncentrality").Number("n_equivalent");
        yield return new Figure("effective_rows", name, rows, null, actual.Number("effective_rows"));
    }

    private static Figure PowerAt(string name, JsonElement expected, JsonElement actual, double fSquared)
    {
        JsonElement line = expected.GetProperty("power").GetProperty("at").EnumerateArray().Single(at => at.GetProperty("cohen_f2").GetDouble() == fSquared);
        return new Figure("power", name, line.Number("power"), null, actual.GetProperty("power").Number("at_bound"));
    }
}
