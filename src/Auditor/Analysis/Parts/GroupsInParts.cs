using Auditor.Data;
using Auditor.Design;
using Auditor.Numerics;
using Auditor.Results;

namespace Auditor.Analysis.Parts;

/// <summary>
/// Every left-out group in the parts of its rows: its test in each part and the test that the effect is the same in all. The tests in the parts of one division are one family
/// over all groups and parts, the differences another. Nothing here enters a verdict.
/// </summary>
internal static class GroupsInParts
{
    /// <param name="shown">Rows of the fit that is shown.</param>
    /// <param name="groups">Each group as it was judged on all its rows.</param>
    /// <returns>For each group its results, one for each division in declared order.</returns>
    public static IReadOnlyList<IReadOnlyList<GroupInParts>> Of(BoundModel model, RowSubset shown, IReadOnlyList<JudgedOnRows> groups, JudgementInputs inputs, RunSettings run)
    {
        var divided = DivisionsOfRows.Of(model, shown, inputs.Policy).Select(division => Divided(model, division, groups, inputs, run)).ToArray();
        return [.. groups.Select((_, group) => (IReadOnlyList<GroupInParts>)[.. divided.Select(division => division[group])])];
    }

    private static IReadOnlyList<GroupInParts> Divided(BoundModel model, Division division, IReadOnlyList<JudgedOnRows> groups, JudgementInputs inputs, RunSettings run)
    {
        if (division.Why is { } why)
        {
            return [.. groups.Select(_ => new GroupInParts(division.By, division.Kind, [], PartFigure.NoDifference(0, why), why))];
        }

        var policy = inputs.Policy;
        var fits = PartFits.Compute(model, division, [.. groups.Select(group => group.Rows?.Rows)], policy.PartRows, run);
        var tests = groups.Select((group, g) => division.Parts.Select((_, part) => fits.Of(part, g) is { } fit
            ? new GroupEvidence(new GroupResults(fit[g], policy.BasisWithoutStructure, inputs.Sampling), policy)
            : null).ToArray()).ToArray();
        var adjusted = Family.Adjust([.. tests.SelectMany(one => one).Select(evidence => P(evidence, policy.Significance))], policy.Adjustment);
        var differences = groups.Select((group, g) => DifferenceOfParts.Of(group.Judgement.Evidence, g, tests[g], fits, inputs.Sampling)).ToArray();
        var adjustedDifferences = Family.Adjust([.. differences.Select(one => one.CannotReject(policy.Significance) ? null : TestFigure.P(one.Test))], policy.Adjustment);
        return
        [
            .. groups.Select((_, g) => new GroupInParts(
                division.By,
                division.Kind,
                [.. division.Parts.Select((part, k) => PartFigure.Of(part.Label, fits.Rows(k, g).Count, fits.Of(k, g), tests[g][k], adjusted[(g * division.Parts.Count) + k], policy))],
                PartFigure.Difference(differences[g], adjustedDifferences[g], policy),
                null)),
        ];
    }

    /// <summary>A test that cannot reject in its part, however large the effect, is no member of the family.</summary>
    private static PValue? P(GroupEvidence? evidence, double level) =>
        evidence is null || evidence.Basis.CannotReject(level) ? null : TestFigure.P(evidence.Basis.Test);
}

/// <summary>A group judged on all its rows; the fit is null when it has none.</summary>
internal sealed record JudgedOnRows(Judgement Judgement, RowSetFit? Rows);
