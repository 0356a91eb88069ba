using System.Globalization;
using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>The refit of the declared final model: its summary figures and the conditioning of its design.</summary>
internal static class FitFigures
{
    public static IEnumerable<Figure> Of(CaseRun run)
    {
        JsonElement fit = run.Record.FinalFit;
        yield return Whole("rows", run.Fit.Number("n"), fit.Number("rows"));
        yield return Whole("rank", run.Fit.Number("rank"), fit.Number("rank"));
        yield return Whole("df_residual", run.Fit.Number("df_resid"), fit.Number("df_residual"));
        if (run.Fit.GetProperty("perfect_fit").GetBoolean())
        {
            yield break;
        }

        foreach (Figure figure in Summary(run, fit).Concat(OverallF(run, fit)).Concat(Conditioning(run, fit)))
        {
            yield return figure;
        }
    }

    private static IEnumerable<Figure> Summary(CaseRun run, JsonElement fit)
    {
        yield return Fit("rss", run.Fit.Number("rss"), run.ExactFit.Number("rss"), fit.Number("rss"));
        yield return Fit("sigma", run.Fit.Number("sigma"), run.ExactFit.Number("sigma"), fit.Number("sigma"));
        yield return Fit("r_squared", run.Fit.Number("r2"), run.ExactFit.Number("r2"), fit.Number("r_squared"), Scales.Share);
        yield return Fit("adjusted_r_squared", run.Fit.Number("adj_r2"), null, fit.Number("adjusted_r_squared"), Scales.Share);
        yield return Fit("log_likelihood", run.Fit.Number("log_likelihood"), null, fit.Number("log_likelihood"), Scales.Unit);
        yield return Fit("aic", run.Fit.Number("aic"), null, fit.Number("aic"), Scales.Unit);
        yield return Fit("bic", run.Fit.Number("bic"), null, fit.Number("bic"), Scales.Unit);
    }

    private static IEnumerable<Figure> OverallF(CaseRun run, JsonElement fit)
    {
        JsonElement expected = run.Fit.GetProperty("overall_F");
        yield return Fit("f", expected.Number("F"), run.ExactFit.Number("overall_F"), fit.Number("f"));
        yield return Whole("f_df1", expected.Number("df1"), fit.Number("f_df1"));
        yield return Whole("f_df2", expected.Number("df2"), fit.Number("f_df2"));
        yield return Fit("f_p", expected.Number("p", "log10_p"), null, fit.Number("f_p", "f_log10_p"));
    }

    private static IEnumerable<Figure> Conditioning(CaseRun run, JsonElement fit)
    {
        JsonElement design = run.Case.Values.GetProperty("collinearity").GetProperty(run.FitName);
        yield return Fit("condition_number", design.Number("condition_number_of_design_with_unit_length_columns"), null, fit.Number("condition_number"));
        double[] expected = Sorted(design.GetProperty("condition_indices"));
        double[] actual = Sorted(run.Record.Collinearity.GetProperty("condition_indices"));
        for (int i = 0; i < Math.Max(expected.Length, actual.Length); i++)
        {
            yield return new Figure("condition index", string.Create(CultureInfo.InvariantCulture, $"{i + 1}"), At(expected, i), null, At(actual, i));
        }
    }

    private static double[] Sorted(JsonElement numbers) => [.. numbers.EnumerateArray().Select(number => number.GetDouble()).Order()];

    private static Quantity? At(double[] numbers, int i) => i < numbers.Length ? new Quantity(numbers[i]) : null;

    private static Figure Fit(string name, Quantity? expected, Quantity? exact, Quantity? actual, double scale = 0) =>
        new("fit " + name, "", expected, exact, actual, scale);

    /// <summary>A count, exact in every route.</summary>
    private static Figure Whole(string name, Quantity? expected, Quantity? actual) => new("fit " + name, "", expected, expected, actual);
}
