using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>Binds a checked declaration to its table: filter, structure, weights, then every term; all problems at once.</summary>
public static class ModelBinder
{
    private const int MostColumns = 5_000;

    public static Reading<BoundDeclaration> Bind(ModelDeclaration declaration, DataTable table)
    {
        var kept = KeepFilter.Apply(table, declaration.Data.Keep, declaration.File);
        if (kept.Value is not { } rows)
        {
            return Reading<BoundDeclaration>.Failed(kept.Problems);
        }

        var structureBinder = new StructureBinder(declaration, table, rows.Rows);
        var structure = structureBinder.Bind();
        var problems = structureBinder.Problems.ToList();
        var binder = new TermBinder(table, rows.Rows, declaration.Data.Columns, declaration.Data.Structure.Period, declaration.File, structureBinder.Order(structure));
        var response = Bound(binder.Bind(declaration.Response), problems);
        var final = All(binder, declaration.FinalModel.Terms, problems);
        var groups = declaration.LeftOut.Select(group => new BoundGroup(group, All(binder, group.Terms, problems))).ToList();
        var weights = BoundWeightsReader.Read(declaration, table, rows.Rows, problems);
        CheckResponse(declaration, response, problems);
        CheckWidth(declaration, [.. final, .. groups.SelectMany(group => group.Terms)], problems);
        return problems.Count > 0
            ? Reading<BoundDeclaration>.Failed([.. problems.Distinct().OrderBy(problem => problem.Line)])
            : Reading<BoundDeclaration>.Of(new BoundDeclaration(
                new BoundModel(table, rows.Rows, declaration.FinalModel.Intercept, response!, final, groups, weights)
                {
                    Structure = structure,
                    RowLabel = declaration.Data.RowLabel is { } label ? table[label.Column] : null,
                },
                [.. rows.Notes, .. binder.Notes]));
    }

    /// <summary>The factor has as many rows as columns: beyond this many it would not fit in memory.</summary>
    private static void CheckWidth(ModelDeclaration declaration, IReadOnlyList<BoundTerm> terms, List<Problem> problems)
    {
        var columns = terms.Sum(term => (long)term.ColumnLabels.Count);
        if (columns > MostColumns)
        {
            var widest = terms.MaxBy(term => term.ColumnLabels.Count)!;
            problems.Add(new Problem(declaration.File, widest.Term.Line, string.Create(
                System.Globalization.CultureInfo.InvariantCulture,
                $"the terms make {columns:#,0} columns, more than the {MostColumns:#,0} that can be audited at once; the widest, {widest.Term.Label}, makes {widest.ColumnLabels.Count:#,0}")));
        }
    }

    private static void CheckResponse(ModelDeclaration declaration, BoundTerm? response, List<Problem> problems)
    {
        if (response is not null && (response.ColumnLabels.Count != 1 || response.Sources.Any(source => source is not NumberColumn && declaration.Response is ColumnTerm)))
        {
            problems.Add(new Problem(
                declaration.File,
                declaration.Response.Line,
                $"response: {declaration.Response.Label} must be one number, found {response.Sources[0].Kind.ToString().ToLowerInvariant()}"));
        }
    }

    private static List<BoundTerm> All(TermBinder binder, IReadOnlyList<Term> terms, List<Problem> problems) =>
        [.. terms.Select(term => Bound(binder.Bind(term), problems)).OfType<BoundTerm>()];

    private static BoundTerm? Bound(Reading<BoundTerm> reading, List<Problem> problems)
    {
        problems.AddRange(reading.Problems);
        return reading.Value;
    }
}

/// <summary>A bound model and what was noted while binding it.</summary>
public sealed record BoundDeclaration(BoundModel Model, IReadOnlyList<BindingNote> Notes);
