using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of the joint test of everything left out.</summary>
public static class AllLeftOutFacts
{
    private static readonly FactFamily<JointView> Family = new FactFamily<JointView>(About.AllLeftOut)
        .Count("groups", "groups", "Left-out groups.", view => view.Groups.Count)
        .Count("groups_rejected", "groups", "Groups whose p_adjusted is at most the policy's significance.", view => view.Rejected)
        .Flag("any_group_rejected", "At least one group is rejected singly, after adjustment.", view => view.Rejected > 0)
        .Count("groups_untestable", "groups", "Groups that could not be tested singly.", view => view.Groups.Count(group => group.Verdict == Verdicts.Untestable))
        .Count("rows", FactUnits.Rows, "Rows complete for the final model and every group.", view => view.Joint.Rows)
        .Count("final_rows", FactUnits.Rows, "Rows of the final model's own fit.", view => view.FinalRows)
        .Number("rows_share", FactUnits.Share, "rows as a share of final_rows.",
            view => view.FinalRows > 0 ? (double)view.Joint.Rows / view.FinalRows : null, _ => "the final model has no rows")
        .Count("df1", FactUnits.DegreesOfFreedom, "Rank that all groups together add.", view => view.Joint.Df1, Why("df1"))
        .Number("df2", FactUnits.DegreesOfFreedom, "Residual degrees of freedom with all groups in.", view => view.Joint.Df2, Why("df2"))
        .Word("basis", "The test on which the joint verdict rests.", FactWords.Bases, view => view.Joint.Basis)
        .Number("p", FactUnits.P, "p of that test; it stands alone and is not adjusted.", view => view.Joint.P, Why("p"))
        .Word("verdict", "What the test says of leaving everything out.", FactWords.Verdicts, view => view.Joint.Verdict)
        .Word("materiality", "What the interval says of the effect against the policy's bound.", FactWords.Materialities, view => view.Joint.Materiality)
        .Text("reason", "What the verdict rests on, in words.", view => view.Joint.Reason)
        .Number("partial_r_squared", FactUnits.PartialRSquared, "Estimated partial R² of all groups together.", view => view.Joint.PartialRSquared.Estimate,
            view => view.Joint.PartialRSquared.Why ?? view.Why("partial_r_squared.estimate"));

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    /// <param name="joint">The test of all left-out terms together.</param>
    /// <param name="groups">The groups tested singly.</param>
    /// <param name="finalRows">Rows complete for the final model alone.</param>
    public static FactSet From(Exclusion joint, IReadOnlyList<Exclusion> groups, int finalRows, Policy policy) =>
        Family.From(new JointView(joint, groups, finalRows, policy), joint.Group, joint.Line);

    private static Func<JointView, string> Why(string path) => view => view.Why(path);

    private sealed record JointView(Exclusion Joint, IReadOnlyList<Exclusion> Groups, int FinalRows, Policy Policy)
    {
        public int Rejected => Groups.Count(group => group.PAdjusted <= Policy.Significance);

        public string Why(string path) => Joint.Why.TryGetValue(path, out var why) ? why : Joint.Reason;
    }
}
