using System.Globalization;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of one step of the author's elimination.</summary>
public static class StepFacts
{
    private static readonly FactFamily<StepResult> Family = new FactFamily<StepResult>(About.Step)
        .Count("step", FactUnits.None, "Place of the step, from 1.", step => step.Step)
        .Text("drop", "The group that it drops.", step => step.Drop)
        .Number("f", FactUnits.None, "Partial F of the group in that step's model.", step => step.F, Why)
        .Number("df1", FactUnits.DegreesOfFreedom, "Rank that the group adds to what else is in.", step => step.Df1, Why)
        .Number("df2", FactUnits.DegreesOfFreedom, "Residual degrees of freedom of that step's model.", step => step.Df2, Why)
        .Number("p", FactUnits.P, "p of that F.", step => step.P, Why)
        .Flag("breaks_rule", "The stated rule would not have taken this step.", step => step.BreaksRule, Why)
        .Text("breaks_because", "How it breaks the rule.", step => step.BreaksBecause, step => step.BreaksRule is false ? "the step keeps the rule" : Why(step));

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(StepResult step) =>
        Family.From(step, "step " + step.Step.ToString(CultureInfo.InvariantCulture), step.Line);

    private static string Why(StepResult step) => step.Why ?? "the stated rule cannot be replayed";
}
