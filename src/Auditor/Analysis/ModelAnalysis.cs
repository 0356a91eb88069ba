using Auditor.Analysis.Claims;
using Auditor.Analysis.Parts;
using Auditor.Declaration;
using Auditor.Design;
using Auditor.Numerics.ResidualChecks;
using Auditor.Numerics.Storage;
using Auditor.Policies;
using Auditor.Results;
using Auditor.Rows;

namespace Auditor.Analysis;

/// <summary>From a bound model to all results: row sets, fits, exclusions, checks.</summary>
internal static class ModelAnalysis
{
    public static Reading<AuditResults> Run(ModelDeclaration declaration, BoundModel model, IReadOnlyCollection<string> mentioned, Policy policy, RunSettings run)
    {
        run.Enter(AuditStep.RowSets);
        var selection = RowSelection.Of(model, run.Threads);
        var common = policy.RowSet == RowSet.Common;
        if ((common ? selection.Common : selection.Final).Count == 0)
        {
            return Reading<AuditResults>.Failed(NoRows(declaration, common));
        }

        run.Enter(AuditStep.Fits);
        var fits = ModelFits.Compute(
            model, selection, common ? selection.Common : selection.Final, run.Pictures ? policy.RowSet : null, DeclaredClaims.NeedCovariances(declaration), run);
        var sampling = model.Weights?.Kind == WeightKind.Sampling;
        var main = (common ? fits.Common : fits.Final)!;
        run.Enter(AuditStep.Influence);
        var fit = CheckedFits.Of(model, main, fits.Residuals, sampling, run.Threads);
        var influence = InfluenceSummary.Of(fit, InfluenceFigures.Shown);
        run.Enter(AuditStep.Checks);
        var serial = SerialBinding.Of(model, main);
        var checks = ResidualCheckFigures.Of(fit, influence, serial, main.Rows, policy.Significance, run.Seed);
        run.Enter(AuditStep.Pictures);
        var plots = run.Pictures ? Pictures(model, fits, fit, serial, influence, main, common) : new PlotData(null, "no pictures were asked for");
        run.Enter(AuditStep.Groups);
        var other = selection.Final.Equals(selection.Common) ? null : common ? fits.Final : fits.Common;
        var shown = new ClaimedRows(main, FitFigures.Of(main, policy.Significance, sampling), sampling, false);
        var beside = other is null ? null : new ClaimedRows(other, FitFigures.Of(other, policy.Significance, sampling), sampling, true);
        var elimination = EliminationFigures.Of(declaration, model, fits.Common, sampling, run.Threads);
        var inputs = new JudgementInputs(policy, sampling, SerialCheckFigures.ResidualMayDrift(checks));
        var exclusions = Exclusions.Of(model, fits, elimination.Selective, inputs, whatIf: run.Pictures);
        var inParts = GroupsInParts.Of(model, main.Rows, exclusions.Judged, inputs, run);
        return Reading<AuditResults>.Of(new AuditResults(
            declaration.Model.Id,
            selection.Account(common, mentioned),
            StructureFigures.Of(model, main.Rows),
            shown.Summary,
            beside?.Summary,
            main.Fit.Perfect,
            [.. exclusions.All.Select((exclusion, group) => exclusion with { InParts = inParts[group] })],
            [.. Enumerable.Range(0, model.Groups.Count).Select(group => Inputs(model, fits, group, common) with { LeftOutByRule = elimination.LeftOutByRule[group], Groups = exclusions.All.Count(exclusion => exclusion.P is not null), Stands = exclusions.Judged[group].Judgement.Group.Stands })],
            AllLeftOut.Of(model, fits.Common, inputs),
            checks,
            InfluenceFigures.Of(influence, main.Rows, model.RowLabel),
            CollinearityFigures.Of(main),
            plots,
            elimination)
        {
            WhatIf = exclusions.WhatIf,
            Claims = ClaimComparison.Of(
                declaration,
                beside is null ? [shown] : [shown, beside],
                exclusions.All,
                [.. Enumerable.Range(0, model.Groups.Count).Select(group => OnOtherRows(fits, group, common))],
                elimination.Steps,
                policy.Significance),
        });
    }

    private static PlotData Pictures(BoundModel model, ModelFits fits, CheckedFit fit, SerialInputs serial, InfluenceSummary influence, RowSetFit main, bool common)
    {
        var plots = PlotFigures.Of(fit, influence, main.Rows, model.RowLabel, weighted: model.Weights is { Kind: not WeightKind.Frequency });
        return plots with
        {
            Plots = plots.Plots is { } residuals
                ? residuals with { InTime = TimePlots.InTime(model, fit, serial, main.Rows), Autocorrelations = TimePlots.Autocorrelations(model, fit, serial, main.Rows) }
                : null,
            Groups = [.. Enumerable.Range(0, model.Groups.Count).Select(group => (common ? fits.Common : fits.Own(group))?[group].Plots)],
        };
    }

    /// <summary>A group on the row set that its exclusion does not rest on; null when they are the same.</summary>
    private static GroupFit? OnOtherRows(ModelFits fits, int group, bool common) =>
        fits.Selection.Own[group].Equals(fits.Selection.Common) ? null : (common ? fits.Own(group) : fits.Common)?[group];

    private static Problem NoRows(ModelDeclaration declaration, bool common) => new(
        declaration.File,
        declaration.Response.Line,
        common
            ? "no row is complete for the final model and every left-out group; the policy says row_set: common"
            : "no row is complete for the final model: in every row that is kept, a column of it is missing, a transform has no value or the weight is 0");

    private static ExclusionInputs Inputs(BoundModel model, ModelFits fits, int group, bool common)
    {
        var rows = common ? fits.Common : fits.Own(group);
        return new ExclusionInputs(
            ProductsElsewhere.Of(model, group),
            rows is null ? [] : [.. rows[group].Sums.RestsOn.Select(position => rows.Rows[position] + 1)]);
    }
}

/// <summary>How an audit is to be run; no result but those drawn at random depends on it.</summary>
/// <param name="Threads">Most row sets to work on at once.</param>
/// <param name="Seed">Seed of everything drawn at random.</param>
/// <param name="Pictures">Whether the points of the pictures are wanted.</param>
internal sealed record RunSettings(int Threads, long Seed, bool Pictures, IProgress<AuditStep>? Steps = null)
{
    /// <summary>Where what has one value a row is kept.</summary>
    public CellStore Store { get; init; } = CellStore.Memory;

    public void Enter(AuditStep step) => Steps?.Report(step);
}
