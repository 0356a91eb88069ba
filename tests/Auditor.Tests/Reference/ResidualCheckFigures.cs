using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

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

    public static IEnumerable<Figure> Of(CaseRun run) => Checks
        .Where(check => run.Case.Values.GetProperty("residual_checks").TryGetProperty(check.Case, out var value) && value.TryGetProperty(check.Statistic, out _))
        .SelectMany(check => Of(run, check));

    private static IEnumerable<Figure> Of(CaseRun run, (string Check, string Case, string Statistic) names)
    {
        JsonElement expected = run.Case.Values.GetProperty("residual_checks").GetProperty(names.Case);
        JsonElement? actual = run.Record.Checks.Find("check", names.Check);
        yield return new Figure(names.Check, "statistic", expected.Number(names.Statistic), null, actual.Number("statistic"));
        if (expected.TryGetProperty("df", out _))
        {
            yield return new Figure(names.Check + " df", "", expected.Number("df"), null, actual.Number("df"));
        }

        if (expected.Number("p") is { } p && (names.Check != "anderson_darling" || p.Number > LeastAndersonDarlingP))
        {
            yield return new Figure(names.Check + " p", "", p, null, actual.Number("p"));
        }
    }
}
