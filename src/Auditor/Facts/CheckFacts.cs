using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of one check of the final model's residuals.</summary>
public static class CheckFacts
{
    private static readonly FactFamily<CheckResult> Family = new FactFamily<CheckResult>(About.Check)
        .Word("check", "Name of the check, as in the record.", FactWords.Checks, check => check.Check)
        .Text("assumption", "The assumption it looks at.", check => check.Assumption)
        .Number("statistic", FactUnits.None, "The check's statistic.", check => check.Statistic, Why)
        .Number("df", FactUnits.DegreesOfFreedom, "First degrees of freedom.", check => check.Df, Why)
        .Number("df2", FactUnits.DegreesOfFreedom, "Second degrees of freedom, for an F.", check => check.Df2, Why)
        .Number("p", FactUnits.P, "p of the check.", check => check.P, Why)
        .Number("p_simulated", FactUnits.P, "p by simulation, where the approximation is poor.", check => check.PSimulated, Why)
        .Number("p_decisive", FactUnits.P, "The p that rejects rests on: p_simulated where there is one, else p.", check => check.DecisiveP, Why)
        .Number("r_squared", FactUnits.None, "Size: R² of the check's auxiliary regression, or partial R² of what it adds.", RSquared, Why)
        .Number("skewness", FactUnits.None, "Size: skewness of the residuals.", check => Size(check, "skewness"), Why)
        .Number("excess_kurtosis", FactUnits.None, "Size: excess kurtosis of the residuals.", check => Size(check, "excess_kurtosis"), Why)
        .Number("autocorrelation", FactUnits.None, "Size: autocorrelation of neighbouring residuals, or the largest of those looked at.", Autocorrelation, Why)
        .Count("row", FactUnits.None, "Row of the source that the check is about.", check => check.Row, Why)
        .Text("variant", "How the check was made or its p is to be read, where there is more than one way.", check => check.Variant, Why)
        .Flag("rejects", "p_decisive is at most the policy's significance.", check => check.Rejects, Why);

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(CheckResult check) => Family.From(check, check.Check, null);

    private static double? Size(CheckResult check, string measure) => check.Size is { } sizes && sizes.TryGetValue(measure, out var size) ? size : null;

    private static double? RSquared(CheckResult check) => Size(check, "auxiliary_r_squared") ?? Size(check, "partial_r_squared");

    private static double? Autocorrelation(CheckResult check) => Size(check, "first_autocorrelation") ?? Size(check, "largest_autocorrelation");

    private static string Why(CheckResult check) => check.Why ?? "the check has no such value";
}
