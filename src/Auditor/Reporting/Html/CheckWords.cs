using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>What residual checks and their assumptions are called.</summary>
internal static class CheckWords
{
    private static readonly Dictionary<string, string> Titles = new()
    {
        ["breusch_pagan"] = "Breusch–Pagan, studentised",
        ["breusch_pagan_original"] = "Breusch–Pagan, original form",
        ["white"] = "White",
        ["jarque_bera"] = "Jarque–Bera",
        ["shapiro_wilk"] = "Shapiro–Wilk",
        ["anderson_darling"] = "Anderson–Darling",
        ["durbin_watson"] = "Durbin–Watson",
        ["breusch_godfrey_1"] = "Breusch–Godfrey, lag 1",
        ["breusch_godfrey_4"] = "Breusch–Godfrey, lags 1 to 4",
        ["ljung_box_4"] = "Ljung–Box, lags 1 to 4",
        ["unit_root_residual"] = "Unit root of the residual",
        ["reset"] = "RESET, powers 2 and 3",
        ["largest_residual"] = "Largest studentised residual, Bonferroni",
        ["chow"] = "Chow, at the declared split",
    };

    private static readonly Dictionary<string, string> Measures = new()
    {
        ["auxiliary_r_squared"] = "R² of its regression",
        ["partial_r_squared"] = "partial R²",
        ["normal_plot_r_squared"] = "R² of the normal plot",
        ["first_autocorrelation"] = "autocorrelation of neighbours",
        ["persistence"] = "share left after one period",
    };

    /// <summary>Each measure with its value.</summary>
    public static string? Size(CheckResult check) => check.Size is { Count: > 0 } sizes
        ? string.Join("; ", sizes.Select(size => (Measures.GetValueOrDefault(size.Key) ?? Spaced(size.Key)) + "\u00A0" + NumberText.Number(size.Value)))
        : null;

    public static string Title(string check) => Titles.GetValueOrDefault(check) ?? Spaced(check);

    /// <summary>The check's name with what is particular to this run of it: the row it found, how its p was had, its variant.</summary>
    public static string Title(CheckResult check) => string.Join(
        ", ",
        new[]
        {
            Title(check.Check),
            check.Row is int row ? "row " + NumberText.Count(row) : null,
            check.Draws is int draws ? $"p simulated with {NumberText.Count(draws)} draws" : null,
            check.Variant,
        }.OfType<string>());

    public static string Spaced(string name) => name.Replace('_', ' ');

    public static string Conclusion(bool? contradicts) => contradicts switch
    {
        true => "contradicted",
        false => "not contradicted",
        null => "not checked",
    };
}
