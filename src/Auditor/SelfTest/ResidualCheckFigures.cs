using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>
/// Residual checks of the final model: R (lmtest, nortest, stats), repeated with numpy and statsmodels. AGREEMENT.md says which programs disagree and why:
/// the case's own values are those that two routes share.
/// </summary>
internal static class ResidualCheckFigures
{
    /// <summary>Below this nortest gives one constant whatever A² is.</summary>
    private const double LeastAndersonDarlingP = 1e-20;

    private static readonly (string Check, string Case, string Statistic)[] Checks =
    [
        ("breusch_pagan", "breusch_pagan_studentised_koenker", "statistic"),
        ("breusch_pagan_original", "breusch_pagan_original", "statistic"),
        ("white", "white", "statistic"),
        ("jarque_bera", "jarque_bera", "statistic"),
        ("shapiro_wilk", "shapiro_wilk", "W"),
        ("anderson_darling", "anderson_darling", "A_squared"),
        ("reset", "reset_powers_2_3_of_fitted", "F"),
    ];

    /// <summary>Nothing for a largest model: the cases hold the checks of the final one.</summary>
    public static IEnumerable<Figure> Of(CaseRun run)
    {
        JsonElement cases = run.Case.Values.GetProperty("residual_checks");
        return run.IsLargest || cases.Optional("not_computed") is not null ? [] : Checks.SelectMany(check => Of(run, cases.GetProperty(check.Case), check.Check, check.Statistic));
    }

    private static IEnumerable<Figure> Of(CaseRun run, JsonElement expected, string check, string statistic)
    {
        JsonElement? actual = run.Record.Checks.Find("check", check);
        if (expected.Optional("not_computed")?.GetString() is { } why)
        {
            return RestsOnTheProgram(why) ? [] : [new Figure(check + " absent", "", null, null, actual.Number("statistic"))];
        }

        Figure value = new(check, "", expected.Number(statistic), null, actual.Number("statistic"), Scales.Share);
        return [value, .. Df(check, expected, actual), .. P(check, expected, actual)];
    }

    private static IEnumerable<Figure> Df(string check, JsonElement expected, JsonElement? actual)
    {
        string first = expected.TryGetProperty("df1", out _) ? "df1" : "df";
        if (expected.TryGetProperty(first, out _))
        {
            yield return new Figure(check + " df", "", expected.Number(first), null, actual.Number("df"));
        }

        if (expected.TryGetProperty("df2", out _))
        {
            yield return new Figure(check + " df2", "", expected.Number("df2"), null, actual.Number("df2"));
        }
    }

    private static IEnumerable<Figure> P(string check, JsonElement expected, JsonElement? actual)
    {
        bool known = check != "anderson_darling" || expected.Number("p")?.Number > LeastAndersonDarlingP;
        return known ? [new Figure(check + " p", "", expected.Number("p", "log10_p"), null, actual.Number("p", "log10_p"))] : [];
    }

    /// <summary>Left out because R could not tell the rank, not because the check does not exist.</summary>
    private static bool RestsOnTheProgram(string why) => why.Contains("collinear", StringComparison.Ordinal);
}
