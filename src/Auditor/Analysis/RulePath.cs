using Auditor.Declaration;
using Auditor.Numerics;
using Auditor.Numerics.Elimination;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The path that the stated rule takes by itself, as the record shows it.</summary>
internal static class RulePath
{
    private const string LargestSaturated = "the model with every candidate in leaves no residual degrees of freedom on the common rows, so the rule has no test to start with";
    private const string LargestPerfect = "the model with every candidate in fits the common rows to rounding, so the rule has no test to start with";

    public static EliminationByRule Of(EliminationDeclaration declared, IReadOnlyList<string> groups, int rows, EliminationUnits? units, EliminationPath? path, string? why)
    {
        var (candidates, replayed) = (units?.Candidates, path is { Impediment: null });
        IReadOnlyList<string> Named(Func<int, bool> chosen) =>
            !replayed ? [] : [.. Enumerable.Range(0, units!.Names.Count).Where(chosen).Select(unit => units.Names[unit])];
        return new EliminationByRule(
            Word(declared.Rule.Criterion),
            declared.Rule.Bound,
            declared.ByTerm ? "term" : "group",
            [.. declared.Forced.Select(term => term.Label)],
            rows,
            !replayed ? [] : [.. path!.Drops.Select((drop, step) => Drop(step + 1, drop, units!))],
            Named(path is null ? _ => false : path.Kept.Contains),
            replayed ? path!.EndsInReported : null,
            Named(unit => path!.Kept.Contains(unit) && candidates!.Units[unit].LeftOut),
            Named(unit => !path!.Kept.Contains(unit) && !candidates!.Units[unit].LeftOut),
            declared.Steps.Count == 0 ? [] : [.. groups.Except(declared.Steps.Select(step => step.Drop))],
            why ?? OfImpediment(path?.Impediment));
    }

    public static string? OfImpediment(Impediment? impediment) => impediment switch
    {
        null => null,
        Impediment.NoResidualDegreesOfFreedom => LargestSaturated,
        _ => LargestPerfect,
    };

    private static RuleDrop Drop(int step, UnitDrop drop, EliminationUnits units)
    {
        var f = drop.Test as FTest;
        return new RuleDrop(
            step,
            units.Names[drop.Unit],
            units.Candidates.Units[drop.Unit].LeftOut,
            f?.Statistic,
            f?.Df1,
            f?.Df2,
            f is null ? null : TestFigure.ShownP(f.Probability),
            f is null ? null : TestFigure.Log10(f.LogP),
            drop.CriterionChange,
            drop.Test switch
            {
                NotComputable { Why: Impediment.AddsNothing } => "it adds no direction to what else is in: dropping it changes no fit, so it goes before any test",
                NotComputable none => ImpedimentWords.Of(none.Why),
                _ => null,
            });
    }

    private static string Word(EliminationCriterion criterion) => criterion switch
    {
        EliminationCriterion.DropAbove => EliminationRules.DropAbove,
        EliminationCriterion.DropWorseAic => EliminationRules.DropWorseAic,
        EliminationCriterion.DropWorseBic => EliminationRules.DropWorseBic,
        _ => EliminationRules.Judgement,
    };
}
