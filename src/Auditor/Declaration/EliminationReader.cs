using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>elimination</c>: the author's path, held against the final model and the groups.</summary>
internal static class EliminationReader
{
    private static readonly IReadOnlyList<string> Rules = ["drop_above", "drop_worse", "judgement"];

    public static EliminationDeclaration? Read(Place place, FinalModelDeclaration? final, IReadOnlyList<LeftOutGroup> groups)
    {
        if (Keys.Of(place, "rule", "by", "forced", "steps") is not { } keys)
        {
            return null;
        }

        var rule = keys.Required("rule", "one of drop_above, drop_worse or judgement") is { } stated ? Rule(stated) : null;
        var by = keys.Optional("by")?.OneOf(("group", false), ("term", true));
        var forced = keys.Optional("forced") is { } kept ? Forced(kept, final?.Terms ?? []) : [];
        var steps = keys.Optional("steps") is { } path ? EliminationStepsReader.Read(path, groups) : [];
        return rule is null ? null : new EliminationDeclaration(rule, by ?? false, forced, steps, keys.Line);
    }

    private static EliminationRule? Rule(Place place)
    {
        if (Keys.Of(place, Rules) is not { } keys)
        {
            return null;
        }

        if (keys.Present(Rules) is [var only])
        {
            return Rule(only, keys.Optional(only)!);
        }

        keys.RefuseChoice("exactly one of drop_above, drop_worse or judgement", Rules);
        return null;
    }

    private static EliminationRule? Rule(string key, Place place) => key switch
    {
        "drop_above" => place.Number("a p between 0 and 1", p => p is > 0 and < 1) is double bound
            ? new EliminationRule(EliminationCriterion.DropAbove, bound, null)
            : null,
        "drop_worse" => place.OneOf(("aic", EliminationCriterion.DropWorseAic), ("bic", EliminationCriterion.DropWorseBic)) is { } criterion
            ? new EliminationRule(criterion, null, null)
            : null,
        _ => place.Text() is { } why ? new EliminationRule(EliminationCriterion.Judgement, null, why) : null,
    };

    /// <summary>Forced terms repeat terms of the final model, so their columns are no mentions of their own.</summary>
    private static IReadOnlyList<Term> Forced(Place place, IReadOnlyList<Term> stayed)
    {
        var reader = new TermReader(new ColumnNames(), "elimination.forced");
        var meanings = stayed.Select(TermMeaning.Of).ToHashSet();
        var forced = new Dictionary<Term, Term>();
        foreach (var item in place.Items("terms") ?? [])
        {
            if (reader.Read(item) is not { } term)
            {
                continue;
            }

            if (!meanings.Contains(TermMeaning.Of(term)))
            {
                var hint = NearestName.Hint(term.Label, [.. stayed.Select(other => other.Label)]);
                item.Add($"the term '{Words.Short(term.Label)}' is not in final_model.terms{hint}");
            }
            else if (!forced.TryAdd(TermMeaning.Of(term), term))
            {
                item.Add(Distinct.Twice("term", term.Label, forced[TermMeaning.Of(term)].Line));
            }
        }

        return [.. forced.Values];
    }
}
