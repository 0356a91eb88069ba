using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>What the checks of one assumption say together, in words.</summary>
internal sealed class CheckFindings(IReadOnlyList<CheckResult> checks, double level)
{
    public const string EqualVariance = "equal_variance";
    public const string Normality = "normality";
    public const string Form = "functional_form";
    public const string Outlier = "no_outlier";
    public const string Independence = "no_serial_correlation";

    /// <summary>Needs normal errors besides, so it never decides a title alone.</summary>
    public const string NeedsNormality = "breusch_pagan_original";

    private static readonly Dictionary<string, (string Contradicted, string Not, string Unknown)> Titles = new()
    {
        [EqualVariance] = ("The spread of the residuals is not equal", "No check speaks against an equal spread", "Whether the spread is equal was not checked"),
        [Normality] = ("Normal errors are contradicted", "No check speaks against normal errors", "Whether errors are normal was not checked"),
        [Form] = ("A curve is left in the residuals", "No check speaks against the form", "The form was not checked"),
    };

    public string Title(string assumption)
    {
        CheckResult[] made = [.. Made(assumption).Where(check => check.Check != NeedsNormality)];
        var (contradicted, not, unknown) = Titles[assumption];
        return made.Length == 0 ? unknown : made.Any(check => check.Contradicts == true) ? contradicted : not;
    }

    /// <summary>Every check of the assumption with its p; the reason when there is none.</summary>
    public string Evidence(string assumption)
    {
        var made = Made(assumption);
        return made.Count > 0
            ? string.Join("; ", made.Select(Evidence)) + "."
            : checks.FirstOrDefault(check => check.Assumption == assumption)?.Why is string why ? $"Not checked: {why}." : "";
    }

    private string Evidence(CheckResult check) =>
        $"{CheckWords.Title(check.Check)}: {Probability(check)}" + (check.Check == NeedsNormality ? " (needs normal errors besides)" : "");

    private List<CheckResult> Made(string assumption) =>
        [.. checks.Where(check => check.Assumption == assumption && check.Rejects is not null && (check.PSimulated ?? check.P) is not null)];

    private string Probability(CheckResult check)
    {
        string text = check.PSimulated is double simulated
            ? NumberText.Probability(simulated, null, level)
            : NumberText.Probability(check.P!.Value, check.Log10P, level);
        return text[0] is '<' or '>' ? "p\u00A0" + text : "p\u00A0=\u00A0" + text;
    }
}
