using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The author's elimination as the page shows it.</summary>
/// <param name="Rule">The stated rule, in a sentence.</param>
/// <param name="Sentences">Where the rule itself ends, and what the record is silent about.</param>
/// <param name="OwnPath">The rule's own path; null when the author's steps are the same or there is none.</param>
/// <param name="Needs">What a p given the rule means and assumes; null when there is none.</param>
internal sealed record EliminationPage(string Rule, IReadOnlyList<string> Sentences, ReportTable? Steps, ReportTable? OwnPath, string? Needs)
{
    private const string Meaning =
        "Each group’s own section gives its p given this rule: among data on which the rule leaves the same groups out, how often would a group without any effect explain at "
        + "least as much as this one does? It assumes that the declared candidates are all there were, that the rule was followed, that errors are independent and normal with equal variance, and "
        + "that the other left-out groups have no effect either. The plain p of a group that this rule dropped on these rows is no evidence: it was dropped because that p was large.";

    public static EliminationPage? Of(AuditRecord record, double level)
    {
        if (record.EliminationByRule is not { } byRule)
        {
            return null;
        }

        var same = byRule.Drops.Select(drop => drop.Drop).SequenceEqual(record.Elimination.Select(step => step.Drop));
        return new EliminationPage(
            RuleWords(byRule),
            [.. Said(byRule, record.Elimination.Count, same)],
            record.Elimination.Count > 0 ? AuthorSteps(record, byRule, level) : null,
            same || byRule.Drops.Count == 0 ? null : RuleSteps(byRule, level),
            record.Exclusions.Any(exclusion => exclusion.Selective.P is not null) ? Meaning : null);
    }

    private static string RuleWords(EliminationByRule byRule)
    {
        var unit = byRule.By == "term" ? "term by term" : "group by group";
        var rule = byRule.Rule switch
        {
            EliminationRules.DropAbove => $"drop what has the largest p, as long as that is above {NumberText.Plain(byRule.Bound ?? 0)}, {unit}",
            EliminationRules.DropWorseAic => $"drop what lowers AIC most, as long as something does, {unit}",
            EliminationRules.DropWorseBic => $"drop what lowers BIC most, as long as something does, {unit}",
            _ => "the author’s judgement",
        };
        return "The stated rule: " + rule + "." + (byRule.Forced.Count == 0 ? "" : $" It could not drop {Listed(byRule.Forced)}.");
    }

    private static IEnumerable<string> Said(EliminationByRule byRule, int steps, bool same)
    {
        if (byRule.Why is { } why)
        {
            yield return $"The rule cannot be replayed: {why}.";
        }
        else
        {
            var rows = string.Create(CultureInfo.InvariantCulture, $"Started from the model with every candidate in, on the {NumberText.Count(byRule.Rows)} rows that all groups have in common, the rule ");
            yield return rows + (byRule.EndsInReportedModel == true ? "ends in the reported model" + (same ? " by the author’s steps." : steps > 0 ? ", by other steps than the author’s." : ".") : Elsewhere(byRule));
        }

        yield return "Steps and replay are judged by the classical F, as such rules usually are, whatever test the verdicts rest on.";
        if (byRule.GroupsNotInSteps.Count > 0)
        {
            yield return $"The author’s steps do not name {Listed(byRule.GroupsNotInSteps)}. What they do not name is taken as a candidate that stayed in through all of the steps.";
        }
    }

    private static string Elsewhere(EliminationByRule byRule)
    {
        string[] parts =
        [
            .. byRule.KeptThoughLeftOut.Count > 0 ? [$"it keeps {Listed(byRule.KeptThoughLeftOut)}, which the report leaves out"] : Array.Empty<string>(),
            .. byRule.DroppedThoughKept.Count > 0 ? [$"it drops {Listed(byRule.DroppedThoughKept)}, which the report keeps"] : Array.Empty<string>(),
        ];
        return "does not end in the reported model: " + string.Join("; ", parts) + ".";
    }

    private static ReportTable AuthorSteps(AuditRecord record, EliminationByRule byRule, double level) => ReportTable.Of(
        "The author’s steps, each tested in that step’s model",
        record.Elimination,
        new("Step", "number", step => Cell.Count(step.Step)),
        new("Dropped", "name", step => Cell.Name(step.Drop)),
        new("Author’s rule", "text", step => Kept(step, byRule)),
        new("F", "number", step => Cell.Number(step.F, step.Why)),
        new("on df", "number", step => Cell.Df(step.Df1, step.Df2, step.Why)),
        new("p", "number", step => Cell.Probability(step.P, step.Log10P, level, step.Why)));

    private static Cell Kept(StepResult step, EliminationByRule byRule) => step.BreaksRule switch
    {
        _ when byRule.Rule == EliminationRules.Judgement => Cell.Words("none to keep"),
        true => Cell.Words("broken: " + step.BreaksBecause),
        false => Cell.Words("kept"),
        null => Cell.Missing(step.Why ?? byRule.Why),
    };

    private static ReportTable RuleSteps(EliminationByRule byRule, double level)
    {
        List<Column<RuleDrop>> columns =
        [
            new("Step", "number", drop => Cell.Count(drop.Step)),
            new("Dropped", "name", drop => Cell.Name(drop.Drop)),
            new("In the report", "text", drop => Cell.Words(drop.LeftOut ? "left out" : "kept")),
            new("F", "number", drop => Cell.Number(drop.F, drop.Why)),
            new("on df", "number", drop => Cell.Df(drop.Df1, drop.Df2, drop.Why)),
            new("p", "number", drop => Cell.Probability(drop.P, drop.Log10P, level, drop.Why)),
        ];
        if (byRule.Rule is EliminationRules.DropWorseAic or EliminationRules.DropWorseBic)
        {
            columns.Add(new("Criterion changes by", "number", drop => Cell.Number(drop.CriterionChange, drop.Why)));
        }

        return ReportTable.Of("What the stated rule itself drops, in its order", byRule.Drops, columns);
    }

    private static string Listed(IReadOnlyList<string> names) =>
        names.Count == 1 ? names[0] : string.Join(", ", names.Take(names.Count - 1)) + " and " + names[^1];
}
