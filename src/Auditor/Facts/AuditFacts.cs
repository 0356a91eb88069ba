using Auditor.Declaration;
using Auditor.Design;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>All facts of an audit, in the order of the record: what rules may speak of.</summary>
internal static class AuditFacts
{
    public static IReadOnlyList<FactSet> Of(AuditResults results, BoundDeclaration bound, IReadOnlyList<ColumnMention> mentions, Policy policy)
    {
        var id = results.ModelId;
        return
        [
            .. results.Exclusions.Select((exclusion, g) => ExclusionFacts.From(exclusion, results.ExclusionInputs[g], policy)),
            .. SegmentFacts.From(results.Exclusions, [.. results.ExclusionInputs.Select(inputs => inputs.Stands)]),
            .. results.AllLeftOut is { } all ? new[] { AllLeftOutFacts.From(all, results.Exclusions, results.FinalFit.Rows, policy) } : [],
            FitFacts.From(id, results.FinalFit, new FitInputs(results.Perfect, results.Exclusions.Count, results.Influence, results.Collinearity)
            {
                Claims = results.Claims,
                Elimination = results.Elimination.ByRule,
            }),
            RowFacts.From(id, results.Rows, results.Structure),
            .. Columns(bound, mentions, results.Rows).Select(ColumnFacts.From),
            .. results.FinalFit.Coefficients.Select(CoefficientFacts.From),
            .. results.Checks.Select(CheckFacts.From),
            .. results.Claims.Figures.Select(claim => ClaimFacts.From(claim, results.Claims.AgainstEachOther)),
            .. results.Elimination.Steps.Select(StepFacts.From),
        ];
    }

    private static IEnumerable<ColumnInputs> Columns(BoundDeclaration bound, IReadOnlyList<ColumnMention> mentions, RowAccount rows)
    {
        var model = bound.Model;
        var terms = model.Groups.SelectMany(group => group.Terms).Concat(model.FinalTerms).ToList();
        var plain = terms.Select(term => term.Term).SelectMany(PlainColumns).ToHashSet(StringComparer.Ordinal);
        var inTerm = terms.SelectMany(term => term.Term.Columns).Select(column => column.Column).ToHashSet(StringComparer.Ordinal);
        var absent = bound.Notes.OfType<LevelWithoutRows>().ToLookup(note => note.Column, note => note.Level, StringComparer.Ordinal);
        foreach (var column in model.Table.Columns)
        {
            var line = mentions.FirstOrDefault(mention => mention.Column == column.Name)?.Line;
            var input = ColumnInputs.Of(column, model.KeptRows, plain.Contains(column.Name) && column.Kind == Data.ColumnKind.Number, inTerm.Contains(column.Name), null, line);
            yield return input with { AbsentLevels = [.. absent[column.Name]] };
        }

        foreach (var name in rows.ColumnsNobodyMentions)
        {
            yield return ColumnInputs.NobodyMentions(name);
        }
    }

    /// <summary>Columns taken as they are, on their own or as a factor of a product.</summary>
    private static IEnumerable<string> PlainColumns(Term term) => term switch
    {
        ColumnTerm column => [column.Column],
        ProductTerm product => product.Factors.SelectMany(PlainColumns),
        _ => [],
    };
}
