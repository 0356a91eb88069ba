using Auditor.Declaration;
using Auditor.Design;
using Auditor.Numerics;
using Auditor.Numerics.Elimination;
using Auditor.Numerics.GroupTests;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>
/// The declared elimination, on the rows common to all groups: the author's steps tested again, the path of the stated rule, and each group's p given that rule.
/// Every left-out group counts as a candidate, named in a step or not.
/// </summary>
internal static class EliminationFigures
{
    private const string NotDeclared = "no elimination is declared";
    private const string ByJudgement = "the groups were left out by judgement, which cannot be replayed";
    private const string Sampling = "sampling weights: a classical test does not apply, and a rule that rests on one cannot be replayed";
    private const string NoRows = "no row is complete for the final model and every left-out group";

    /// <param name="common">The common rows; null when there are none.</param>
    /// <param name="threads">Most groups to work on at once; each is computed by itself.</param>
    public static EliminationResults Of(ModelDeclaration declaration, BoundModel model, RowSetFit? common, bool sampling, int threads)
    {
        var groups = model.Groups.Select(group => group.Declared.Name).ToList();
        if (declaration.Elimination is not { } declared)
        {
            return new EliminationResults([], null, None(groups, NotDeclared), [.. groups.Select(_ => false)]);
        }

        if (common is null || sampling)
        {
            return Without(declared, groups, common, common is null ? NoRows : Sampling);
        }

        var units = EliminationUnits.Of(declared, model, common);
        var rule = Rule(declared.Rule);
        var why = rule is null ? ByJudgement : units.Names.Count > UnitSet.Most ? $"more than {UnitSet.Most} candidates" : null;
        var path = why is null ? new EliminationPath(common.Final, units.Candidates, rule!) : null;
        return new EliminationResults(
            new AuthorSteps(declared, groups, common, units, path).Tested(),
            RulePath.Of(declared, groups, (int)common.Fit.N, units, path, why),
            why is null ? Selective(declared.Rule, units.Candidates, path!, common, threads) : None(groups, why),
            [.. groups.Select((_, group) => rule is not null && !(path is { Impediment: null } && units.OfGroup(group).Any(path.Kept.Contains)))]);
    }

    private static EliminationResults Without(EliminationDeclaration declared, List<string> groups, RowSetFit? common, string why) => new(
        [.. declared.Steps.Select((step, index) => new StepResult(index + 1, step.Drop, null, null, null, null, null, why) { Line = step.Line })],
        RulePath.Of(declared, groups, common is null ? 0 : (int)common.Fit.N, null, null, why),
        None(groups, why),
        [.. groups.Select(_ => Rule(declared.Rule) is not null)]);

    private static SelectiveFigures[] Selective(EliminationRule rule, Candidates candidates, EliminationPath path, RowSetFit common, int threads)
    {
        var computed = new SelectiveFigures[common.Plan.Groups.Count];
        Parallel.For(0, computed.Length, new ParallelOptions { MaxDegreeOfParallelism = threads }, group => computed[group] = OfGroup(rule, candidates, path, common, group));
        return computed;
    }

    private static SelectiveFigures OfGroup(EliminationRule declared, Candidates candidates, EliminationPath path, RowSetFit common, int group)
    {
        var added = common[group].Added;
        return SelectiveP.Of(added, candidates, Rule(declared)!, path) switch
        {
            SelectiveTest test => new SelectiveFigures(TestFigure.ShownP(test.Probability), null)
            {
                Log10P = TestFigure.Log10(test.LogP),
                Rows = (int)common.Fit.N,
                PlainP = PartialF.Of(added).P,
                Selection = test.Selection,
            },
            NotComputable none => new SelectiveFigures(null, path.Impediment is null ? ImpedimentWords.Of(none.Why) : RulePath.OfImpediment(path.Impediment)),
            _ => new SelectiveFigures(null, ImpedimentWords.Of(Impediment.NotFinite)),
        };
    }

    private static DroppingRule? Rule(EliminationRule declared) => declared.Criterion switch
    {
        EliminationCriterion.DropAbove => new DroppingRule(DroppingCriterion.PartialF, declared.Bound!.Value),
        EliminationCriterion.DropWorseAic => new DroppingRule(DroppingCriterion.Aic, 0),
        EliminationCriterion.DropWorseBic => new DroppingRule(DroppingCriterion.Bic, 0),
        _ => null,
    };

    private static SelectiveFigures[] None(List<string> groups, string why) => [.. groups.Select(_ => new SelectiveFigures(null, why))];
}
