using Auditor.Declaration;
using Auditor.Design;
using Auditor.Numerics.Elimination;

namespace Auditor.Analysis;

/// <summary>
/// The candidates of a declared elimination with their names: every term of the final model that is not forced, then every left-out group, or each of its terms. The
/// intercept is no candidate. A term is one unit whatever its columns.
/// </summary>
internal sealed record EliminationUnits(Candidates Candidates, IReadOnlyList<string> Names, IReadOnlyList<int?> Groups)
{
    public static EliminationUnits Of(EliminationDeclaration declared, BoundModel model, RowSetFit common)
    {
        var forced = declared.Forced.Select(TermMeaning.Of).ToHashSet();
        var (kept, found) = (new List<int>(), new List<Unit>());
        if (model.Intercept)
        {
            kept.Add(0);
        }

        foreach (var (term, group, columns) in Terms(model, common.Plan))
        {
            if (group is null && forced.Contains(TermMeaning.Of(term.Term)))
            {
                kept.AddRange(columns);
            }
            else
            {
                found.Add(new Unit(term.Term.Label, group, columns));
            }
        }

        var units = declared.ByTerm ? found : Together(found, model);
        return new EliminationUnits(
            new Candidates(kept, [.. units.Select(unit => new CandidateUnit(unit.Columns, unit.Group is not null))], common.Fit.N),
            [.. units.Select(unit => unit.Name)],
            [.. units.Select(unit => unit.Group)]);
    }

    public IEnumerable<int> OfGroup(int group) => Enumerable.Range(0, Groups.Count).Where(unit => Groups[unit] == group);

    private static List<Unit> Together(List<Unit> found, BoundModel model) =>
    [
        .. found.Where(unit => unit.Group is null),
        .. found.Where(unit => unit.Group is not null).GroupBy(unit => unit.Group)
            .Select(group => new Unit(model.Groups[group.Key!.Value].Declared.Name, group.Key, [.. group.SelectMany(unit => unit.Columns)])),
    ];

    /// <summary>Every term with its group (null: the final model's) and its columns in the plan, which holds all groups.</summary>
    private static IEnumerable<(BoundTerm Term, int? Group, int[] Columns)> Terms(BoundModel model, DesignPlan plan)
    {
        var groups = model.FinalTerms.Select(_ => (int?)null).Concat(model.Groups.SelectMany((group, g) => group.Terms.Select(_ => (int?)g)));
        return plan.TermColumns().Zip(groups, (term, group) =>
            (term.Term, group, Enumerable.Range(term.Column, term.Term.ColumnLabels.Count).ToArray()));
    }

    private sealed record Unit(string Name, int? Group, IReadOnlyList<int> Columns);
}
