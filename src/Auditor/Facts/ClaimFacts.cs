using Auditor.Results;

namespace Auditor.Facts;

/// <summary>One reported figure with what contradicts it among the others.</summary>
internal sealed record ClaimView(ClaimResult Of, IReadOnlyList<ClaimRelation> Broken);

/// <summary>The facts of one figure that the report prints.</summary>
public static class ClaimFacts
{
    private static readonly FactFamily<ClaimView> Family = new FactFamily<ClaimView>(About.Claim)
        .Text("what", "The figure in words.", view => view.Of.What)
        .Word("part", "What the figure is of.", FactWords.ClaimParts, view => Part(view.Of.Claim))
        .Word("kind", "What kind of figure it is.", ClaimKinds.All, view => view.Of.Kind)
        .Text("reported", "The figure as the report prints it.", view => view.Of.Reported)
        .Number("recomputed", FactUnits.None, "The figure as recomputed.", view => view.Of.Recomputed, NoValue)
        .Text("recomputed_as_printed", "The recomputed figure rounded as the report rounds.", view => view.Of.RecomputedAsPrinted, NoValue)
        .Word("outcome", "What comes of comparing them at the digits printed.", ClaimOutcomes.All, view => view.Of.Outcome)
        .Text("remark", "What else must be said of the comparison, after a semicolon; empty when nothing must.", view => view.Of.Why is { } why ? "; " + why : "")
        .Flag("other_sign", "An estimate that is not reproduced has another sign than the recomputed one.", view => view.Of.OtherSign)
        .Flag("other_side_of_significance", "A p that is not reproduced lies on the other side of the policy's significance than the recomputed one.", view => view.Of.OtherSideOfSignificance)
        .Flag("in_other_form", "The figure is reproduced by another form than the classical one.", view => view.Of.ReproducedBy is not null)
        .Text("reproduced_by", "That form.", view => view.Of.ReproducedBy is { } form ? FormNames.InWords(form) : null, _ => "the classical form, or none, reproduces it")
        .Flag("on_other_rows", "The figure is reproduced on the other row set only.", view => view.Of.Rows is not null)
        .Flag("contradicts_others", "Other reported figures and this one cannot all be right, whatever the data.", view => view.Broken.Count > 0)
        .Text("contradiction", "What they contradict.", view => string.Join("; ", view.Broken.Select(broken => $"{broken.Relation}, but {broken.Why}")));

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    /// <param name="relations">All relations between reported figures; a broken one is told of the figure that follows from the others.</param>
    public static FactSet From(ClaimResult claim, IReadOnlyList<ClaimRelation> relations) =>
        Family.From(new ClaimView(claim, [.. relations.Where(relation => !relation.Consistent && relation.Claims[0] == claim.Claim)]), claim.Claim, claim.Line);

    private static string Part(string path) =>
        path.StartsWith("left_out[", StringComparison.Ordinal) ? "left_out"
        : path.StartsWith("elimination.", StringComparison.Ordinal) ? "step"
        : path.StartsWith("reported.coefficients[", StringComparison.Ordinal) ? "coefficient"
        : "final_model";

    private static string NoValue(ClaimView view) => view.Of.Why ?? "it cannot be recomputed";
}
