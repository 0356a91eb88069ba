using Auditor.Declaration;
using Auditor.Design;
using Auditor.Policies;
using Auditor.Results;
using Auditor.Rows;

namespace Auditor.Analysis;

/// <summary>From a bound model to all results: row sets, fits, exclusions, checks.</summary>
internal static class ModelAnalysis
{
    public static Reading<AuditResults> Run(ModelDeclaration declaration, BoundModel model, IReadOnlyCollection<string> mentioned, Policy policy, int threads)
    {
        var selection = RowSelection.Of(model);
        var common = policy.RowSet == RowSet.Common;
        if ((common ? selection.Common : selection.Final).Count == 0)
        {
            return Reading<AuditResults>.Failed(NoRows(declaration, common));
        }

        var fits = ModelFits.Compute(model, selection, threads);
        var sampling = model.Weights?.Kind == WeightKind.Sampling;
        var main = (common ? fits.Common : fits.Final)!;
        var other = selection.Final.Equals(selection.Common) ? null : common ? fits.Final : fits.Common;
        return Reading<AuditResults>.Of(new AuditResults(
            declaration.Model.Id,
            selection.Account(common, mentioned),
            FitFigures.Of(main, policy.Significance, sampling),
            other is null ? null : FitFigures.Of(other, policy.Significance, sampling),
            main.Fit.Perfect,
            Exclusions.Of(model, fits, policy, sampling),
            [.. Enumerable.Range(0, model.Groups.Count).Select(group => Inputs(model, fits, group, common))],
            AllLeftOut.Of(model, fits.Common, policy, sampling),
            NotYet.ResidualChecks(),
            NotYet.Influence([]),
            CollinearityFigures.Of(main)));
    }

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
            rows is null ? [] : [.. rows[group].Sums.RestsOn.Select(position => rows.Rows.Rows[position] + 1)]);
    }
}
