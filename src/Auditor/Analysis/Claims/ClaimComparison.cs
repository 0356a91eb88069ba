using Auditor.Analysis.Claims.Relations;
using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>The author's reported figures against the data, and against each other.</summary>
internal static class ClaimComparison
{
    /// <param name="rows">The final model on the rows shown, then on the other row set where there is one.</param>
    /// <param name="exclusions">In the order of the declaration's groups.</param>
    /// <param name="others">Each group on the other row set; null where that is the same, or empty.</param>
    /// <param name="steps">The elimination's steps as replayed; null figures where a step was not.</param>
    public static ClaimsAudit Of(
        ModelDeclaration declaration,
        IReadOnlyList<ClaimedRows> rows,
        IReadOnlyList<Exclusion> exclusions,
        IReadOnlyList<GroupFit?> others,
        IReadOnlyList<StepResult> steps,
        double significance)
    {
        var claims = DeclaredClaims.Of(declaration);
        var judgement = new ClaimJudgement(significance);
        var fitted = new FitClaimsOnRows(claims.Fit, rows, judgement);
        ClaimResult[] figures =
        [
            .. fitted.Figures,
            .. claims.Groups.SelectMany(group => Group(group, exclusions[group.Of], others[group.Of], rows[0].Sampling, judgement)),
            .. claims.Steps.SelectMany(step => TestClaims.Of(step, TestForm.OfStep(steps[step.Of]), StepWhy(steps[step.Of]), judgement)),
        ];
        var fit = new ReportedFit(
            claims.Fit, rows[0].Summary.Rank, declaration.FinalModel.Intercept ? 1 : 0, rows[0].Summary.DfResidual, declaration.Data.Structure.Cluster is null, figures);
        return new ClaimsAudit(figures, fitted.StandardErrors, ClaimRelations.Of(claims, fit));
    }

    private static IEnumerable<ClaimResult> Group(ClaimedTest claimed, Exclusion exclusion, GroupFit? other, bool sampling, ClaimJudgement judgement) =>
        TestClaims.Of(claimed, TestForm.OfGroup(exclusion.Tests, other, sampling), exclusion.TestsNotComputed.GetValueOrDefault("classical"), judgement);

    private static string StepWhy(StepResult step) => "the step was not replayed" + (step.Why is null ? "" : ": " + step.Why);
}
