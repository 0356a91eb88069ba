using Auditor.Declaration;
using Auditor.Numerics;
using Auditor.Numerics.Elimination;
using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>
/// The author's steps, each tested in its own model on the common rows: the final model with every left-out group that no earlier step dropped. A step keeps the stated
/// rule when the rule, at that model, drops exactly that group next; term by term, when its next drops are that group's terms until none is left. A group that adds
/// no rank can be dropped at any step: no fit is changed by it.
/// </summary>
internal sealed class AuthorSteps(EliminationDeclaration declared, List<string> groups, RowSetFit common, EliminationUnits units, EliminationPath? path)
{
    public IReadOnlyList<StepResult> Tested()
    {
        var (steps, inside) = (new List<StepResult>(), Enumerable.Range(0, groups.Count).ToList());
        foreach (var step in declared.Steps)
        {
            var group = groups.IndexOf(step.Drop);
            inside.Remove(group);
            steps.Add(Step(steps.Count + 1, step, group, inside));
        }

        return steps;
    }

    private StepResult Step(int number, EliminationStep step, int group, List<int> others)
    {
        int[] before = [.. others.SelectMany(other => common.Plan.Layout.Groups[other].Indices)];
        var added = AddedGroup.After(common.Final, before, [.. common.Plan.Layout.Groups[group].Indices]);
        var test = PartialF.Of(added);
        var f = test as FTest;
        var breach = path is { Impediment: null } && f is not null ? Breach(path, group, others) : null;
        return new StepResult(number, step.Drop, f?.Statistic, f?.Df1, f?.Df2, test.P is double p ? TestFigure.ShownP(p) : null, Breaks(test, breach), Why(test))
        {
            Log10P = f is null ? null : TestFigure.Log10(f.LogP),
            BreaksBecause = breach,
            Line = step.Line,
        };
    }

    private bool? Breaks(TestResult test, string? breach) =>
        declared.Rule.Criterion == EliminationCriterion.Judgement || test is NotComputable { Why: Impediment.AddsNothing } ? false
        : path is not { Impediment: null } || test is not FTest ? null
        : breach is not null;

    private static string? Why(TestResult test) => test switch
    {
        NotComputable { Why: Impediment.AddsNothing } => "in that step's model the group adds no direction: dropping it changes no fit",
        NotComputable none => ImpedimentWords.Of(none.Why),
        PerfectWithGroup => "that step's model fits to rounding with the group and not without it: F has no finite value",
        _ => null,
    };

    /// <summary>How dropping the group here breaks the rule; null when it does not.</summary>
    private string? Breach(EliminationPath rule, int group, List<int> others)
    {
        var own = units.OfGroup(group).ToHashSet();
        var set = UnitSet.Of(Enumerable.Range(0, units.Names.Count).Where(unit => units.Groups[unit] is not int g || g == group || others.Contains(g)));
        while (own.Count > 0)
        {
            // Terms of the group that add nothing go first, as everywhere.
            var next = own.Cast<int?>().FirstOrDefault(unit => rule.Removal(set, unit!.Value).Test is NotComputable { Why: Impediment.AddsNothing }) ?? rule.NextTested(set);
            if (next is not int unit || !own.Remove(unit))
            {
                return Words(rule, set, own, next);
            }

            set = set.Without(unit);
        }

        return null;
    }

    private string Words(EliminationPath rule, UnitSet set, HashSet<int> own, int? next)
    {
        var best = own.Select(unit => rule.Removal(set, unit)).MaxBy(removal => declared.Rule.Bound is null ? -removal.CriterionChange : removal.Test.P)!;
        var name = units.Names[best.Unit];
        if (declared.Rule.Bound is double bound)
        {
            return best.Test.P <= bound
                ? $"{PlainNumber.PAgainst(best.Test.P.Value, bound)} of {name} is not above {PlainNumber.Digits(bound, 4)}"
                : $"{units.Names[next!.Value]} has a larger p here: {PlainNumber.P(rule.Removal(set, next.Value).Test.P ?? 0)}";
        }

        var criterion = declared.Rule.Criterion == EliminationCriterion.DropWorseAic ? "AIC" : "BIC";
        return best.CriterionChange >= 0
            ? $"without {name} {criterion} would rise by {PlainNumber.Share(best.CriterionChange.Value)}"
            : $"without {units.Names[next!.Value]} {criterion} would fall more: by {PlainNumber.Share(-rule.Removal(set, next.Value).CriterionChange ?? 0)}";
    }
}
