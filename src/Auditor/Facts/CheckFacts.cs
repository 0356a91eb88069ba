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
        .Count("row", FactUnits.None, "Row of the source that the check is about.", check => check.Row, Why)
        .Text("variant", "How the check was made or its p is to be read, where there is more than one way.", check => check.Variant, Why)
        .Flag("rejects", "p_decisive is at most the policy's significance.", check => check.Rejects, Why);

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(CheckResult check) => Family.From(check, check.Check, null);

    private static string Why(CheckResult check) => check.Why ?? "the check has no such value";
}
