using Auditor.Analysis.Parts;
using Auditor.Design;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>
/// Every left-out group judged on the row set the policy asks for, with its test on the other row set beside it when the rows differ. Each kind of row
/// set is a family of its own.
/// </summary>
internal static class Exclusions
{
    /// <param name="selective">p of each group given the author's rule.</param>
    /// <param name="whatIf">Whether verdicts at other levels and bounds are wanted.</param>
    public static JudgedExclusions Of(
        BoundModel model, ModelFits fits, IReadOnlyList<SelectiveFigures> selective, JudgementInputs inputs, bool whatIf)
    {
        var (policy, sampling, _) = inputs;
        var groups = Enumerable.Range(0, model.Groups.Count).ToArray();
        var known = new Dictionary<GroupFit, GroupResults>(ReferenceEqualityComparer.Instance);
        var own = OnRows(model, groups, fits.Own, inputs, known);
        var common = OnRows(model, groups, _ => fits.Common, inputs, known);
        var (main, other) = policy.RowSet == RowSet.Own ? (own, common) : (common, own);
        IReadOnlyList<Exclusion> exclusions = [.. groups.Select(group =>
        {
            var sameRows = fits.Selection.Own[group].Equals(fits.Selection.Common);
            return ExclusionFigures.Of(
                Identity(model.Groups[group]),
                main[group].Judgement,
                main[group].Rows,
                sameRows ? null : ExclusionFigures.Other(other[group].Judgement, other[group].Rows),
                fits.Common?[group],
                selective[group],
                policy,
                sampling);
        })];
        return new JudgedExclusions(exclusions, whatIf ? OtherThresholds.Of([.. main.Select(group => group.Judgement.Group)], policy) : null)
        {
            Judged = [.. main.Select(group => new JudgedOnRows(group.Judgement, group.Rows))],
        };
    }

    private static List<(Judgement Judgement, RowSetFit? Rows)> OnRows(
        BoundModel model, int[] groups, Func<int, RowSetFit?> rows, JudgementInputs inputs, Dictionary<GroupFit, GroupResults> known)
    {
        var (policy, sampling, drifts) = inputs;
        var judged = groups.Select(group => new JudgedGroup(
            rows(group) is { } fit ? new GroupEvidence(Results(fit[group]), policy) : null,
            ProductsElsewhere.Of(model, group) is [var product, ..] ? product : null)
        {
            Drifts = drifts && model.Groups[group].Terms.Any(term => SerialBinding.MayDrift(term.Term)),
        }).ToList();
        return [.. Judgement.OfFamily(judged, policy).Select((judgement, group) => (judgement, rows(group)))];

        // Own rows and common rows are often the same fit: its tests are made once.
        GroupResults Results(GroupFit fit) =>
            known.TryGetValue(fit, out var made) ? made : known[fit] = new GroupResults(fit, policy.BasisWithoutStructure, sampling);
    }

    private static GroupIdentity Identity(BoundGroup group) => new(
        group.Declared.Name, [.. group.Terms.Select(term => term.Term.Label)], group.Declared.Because, group.Declared.Line);
}

/// <param name="WhatIf">Null when it was not asked for.</param>
internal sealed record JudgedExclusions(IReadOnlyList<Exclusion> All, WhatIf? WhatIf)
{
    /// <summary>Each group as it was judged on the row set that the policy asks for.</summary>
    public required IReadOnlyList<JudgedOnRows> Judged { get; init; }
}

/// <summary>What the judgement of every group depends on beside its tests.</summary>
/// <param name="Sampling">Sampling weights are declared.</param>
/// <param name="ResidualMayDrift">A unit root of the final model's residual is not rejected.</param>
internal sealed record JudgementInputs(Policy Policy, bool Sampling, bool ResidualMayDrift);
