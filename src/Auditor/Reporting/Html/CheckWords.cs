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

    /// <summary>Checks whose p needs independent rows, whatever else they assume.</summary>
    private static readonly (string Check, string Title)[] Independent =
    [
        ("breusch_pagan", "Breusch–Pagan"), ("white", "White"), ("reset", "RESET"), ("chow", "Chow"),
    ];

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

    /// <summary>Said where rows are declared to belong together or to follow in time, and a check was made that takes them as independent.</summary>
    public static string? NeedIndependence(AuditRecord record)
    {
        bool declared = record.Structure is { } structure && (structure.Clusters ?? structure.Units ?? structure.Periods) is not null;
        string[] names = [.. Independent.Where(name => record.Checks.Any(check => check.Check == name.Check && check.P is not null)).Select(name => name.Title)];
        return !declared || names.Length == 0 ? null
            : $"{Listed(names)} {(names.Length == 1 ? "takes" : "take")} the rows as independent: where residuals move together within a cluster or a unit, or carry over in time, "
                + $"{(names.Length == 1 ? "its p is" : "their p are")} too small to rely on.";
    }

    private static string Listed(string[] names) => names.Length == 1 ? names[0] : $"{string.Join(", ", names[..^1])} and {names[^1]}";

    public static string Spaced(string name) => name.Replace('_', ' ');

    public static string Conclusion(bool? contradicts) => contradicts switch
    {
        true => "contradicted",
        false => "not contradicted",
        null => "not checked",
    };
}
