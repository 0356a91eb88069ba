using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>Every coefficient with its classical test and interval; estimates and limits relative to max(|b|, standard error).</summary>
internal static class CoefficientFigures
{
    public static IEnumerable<Figure> Of(CaseRun run) => run.Fit.GetProperty("coefficients").EnumerateArray().SelectMany(expected => Of(run, expected));

    private static IEnumerable<Figure> Of(CaseRun run, JsonElement expected)
    {
        string name = expected.Text("name");
        JsonElement actual = run.Record.Coefficient(run.Label(name)) ?? throw new InvalidOperationException("The record has no coefficient " + run.Label(name));
        JsonElement? exact = run.ExactFit is { } fit ? fit.GetProperty("coefficients").Find("name", name) : null;
        double error = expected.Number("standard_error")?.Number ?? 0;
        yield return new Figure("coefficient estimate", name, expected.Number("estimate"), exact.Number("estimate"), actual.Number("estimate"), error);
        if (run.Fit.GetProperty("perfect_fit").GetBoolean())
        {
            yield break;
        }

        yield return new Figure("coefficient standard_error", name, expected.Number("standard_error"), exact.Number("standard_error"), actual.Number("standard_error"));
        yield return new Figure("coefficient t", name, expected.Number("t"), null, actual.Number("t"), Scales.Unit);
        if (!Underflows(expected))
        {
            yield return new Figure("coefficient p", name, expected.Number("p"), null, actual.Number("p"));
        }

        yield return new Figure("coefficient lower", name, expected.Number("lower_95"), null, actual.Number("lower"), error);
        yield return new Figure("coefficient upper", name, expected.Number("upper_95"), null, actual.Number("upper"), error);
    }

    /// <summary>case.json holds no logarithm of a coefficient's p.</summary>
    private static bool Underflows(JsonElement expected) => expected.Number("p") is { Number: < 1e-290 };
}
