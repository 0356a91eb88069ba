using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Parts of the record that are not computed yet: listed with the reason, never left out, the author's digits kept.</summary>
internal static class NotYet
{
    private const string Why = "not built yet";
    private const string NotCompared = "not_compared";

    private static readonly (string Check, string Assumption)[] Checks =
    [
        ("breusch_pagan", "equal_variance"),
        ("breusch_pagan_original", "equal_variance"),
        ("white", "equal_variance"),
        ("jarque_bera", "normality"),
        ("shapiro_wilk", "normality"),
        ("anderson_darling", "normality"),
        ("durbin_watson", "no_serial_correlation"),
        ("breusch_godfrey_1", "no_serial_correlation"),
        ("breusch_godfrey_4", "no_serial_correlation"),
        ("ljung_box_4", "no_serial_correlation"),
        ("unit_root_residual", "stationary_residual"),
        ("reset", "functional_form"),
        ("largest_residual", "no_outlier"),
        ("chow", "stable_coefficients"),
    ];

    public static IReadOnlyList<CheckResult> ResidualChecks() =>
        [.. Checks.Select(check => new CheckResult(check.Check, null, null, null, null, check.Assumption, null, WhyOf(check.Check)))];

    public static Influence Influence(IReadOnlyList<int> leverageOne) => new(leverageOne, []) { Why = Why };

    public static IReadOnlyList<ClaimResult> Claims(ModelDeclaration declaration)
    {
        var claims = new List<ClaimResult>();
        void Add(string path, ReportedFigure? figure)
        {
            if (figure is not null)
            {
                claims.Add(new ClaimResult(path, figure.Text, null, NotCompared));
            }
        }

        AddFit(declaration.Reported, Add);
        foreach (var group in declaration.LeftOut)
        {
            AddTest($"left_out[{group.Name}].reported", group.Reported, Add);
        }

        foreach (var (step, index) in (declaration.Elimination?.Steps ?? []).Select((step, index) => (step, index + 1)))
        {
            AddTest(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"elimination.steps[{index}].reported"), step.Reported, Add);
        }

        return claims;
    }

    public static IReadOnlyList<StepResult> Elimination(ModelDeclaration declaration) =>
        [.. (declaration.Elimination?.Steps ?? []).Select((step, index) => new StepResult(index + 1, step.Drop, null, null, null, null, null, Why))];

    private static string WhyOf(string check) => check switch
    {
        "durbin_watson" or "breusch_godfrey_1" or "breusch_godfrey_4" or "ljung_box_4" or "unit_root_residual" => "no time order declared",
        "chow" => "no split declared",
        _ => Why,
    };

    private static void AddFit(ReportedFigures? reported, Action<string, ReportedFigure?> add)
    {
        add("reported.rows_used", reported?.RowsUsed);
        add("reported.r_squared", reported?.RSquared);
        add("reported.adjusted_r_squared", reported?.AdjustedRSquared);
        add("reported.residual_sd", reported?.ResidualSd);
        add("reported.f", reported?.F);
        foreach (var coefficient in reported?.Coefficients ?? [])
        {
            var path = $"reported.coefficients[{coefficient.Label}].";
            add(path + "estimate", coefficient.Estimate);
            add(path + "standard_error", coefficient.StandardError);
            add(path + "p", coefficient.P);
        }
    }

    private static void AddTest(string path, ReportedTest? reported, Action<string, ReportedFigure?> add)
    {
        add(path + ".f", reported?.F);
        for (var i = 0; i < (reported?.Df.Count ?? 0); i++)
        {
            add(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{path}.df[{i + 1}]"), reported!.Df[i]);
        }

        add(path + ".p", reported?.P);
    }
}
