using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>What follows for the verdicts from an assumption that a check contradicts.</summary>
internal sealed record CheckConsequence(string Assumption, string Checks, string Follows)
{
    /// <summary>One for each contradicted assumption, in the order of the checks.</summary>
    public static IReadOnlyList<CheckConsequence> Of(AuditRecord record) =>
    [
        .. record.Checks.Where(check => check.Contradicts == true).GroupBy(check => check.Assumption).Select(group => new CheckConsequence(
            CheckWords.Spaced(group.Key), string.Join("; ", group.Select(check => CheckWords.Title(check.Check))), FollowsFrom(group.Key, [.. group], record))),
    ];

    private static string FollowsFrom(string assumption, IReadOnlyList<CheckResult> rejecting, AuditRecord record) => assumption switch
    {
        CheckFindings.EqualVariance => OriginalFormAlone(rejecting) + UnequalSpread(record.Exclusions),
        CheckFindings.Normality =>
            "It matters for p-values in small samples, where single residuals carry weight, and little in large ones; "
            + $"here {NumberText.Count(record.FinalFit.DfResidual)} residual degrees of freedom are left.",
        CheckFindings.Form => "A group that is not supported may be standing in for a curve that the model lacks; give its terms their right form before the group is read as needed.",
        CheckFindings.Outlier => $"A verdict may hang on {(rejecting[0].Row is int row ? "row " + NumberText.Count(row) : "this row")}: see the rows that move the fit.",
        "no_serial_correlation" => "Tests that take rows as independent, HC3 among them, have p-values that cannot be relied on.",
        "stationary_residual" => "Series that wander look related when they are not: a group with a term that is not a change cannot be judged by these tests.",
        "stable_coefficients" => "The final model is an average over parts that differ; a verdict need not hold in each of them.",
        _ => "The tests that assume it have p-values that cannot be relied on.",
    };

    private static string OriginalFormAlone(IReadOnlyList<CheckResult> rejecting) => rejecting.All(check => check.Check == CheckFindings.NeedsNormality)
        ? "Only the original form speaks against it, and that form needs normal errors besides. "
        : "";

    private static string UnequalSpread(IReadOnlyList<Exclusion> exclusions)
    {
        string classical = TestWords.All[0].Name;
        string[] groups = [.. exclusions.Where(exclusion => exclusion.Basis == classical).Select(exclusion => exclusion.Group)];
        string[] robust = [.. exclusions.Select(exclusion => exclusion.Basis).Where(basis => basis != classical).Distinct().Select(TestWords.TitleOf)];
        string rest = robust.Length > 0
            ? $"{(groups.Length == 0 ? "The verdicts rest" : "The other verdicts rest")} on {string.Join(" and ", robust)}, which does not need an equal spread. "
            : "";
        return (groups.Length == 0 ? "" : $"The verdict on {string.Join(", ", groups)} rests on the classical test, which needs an equal spread: read it with care. ")
            + rest + "The classical tests need one.";
    }
}
