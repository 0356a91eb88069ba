using Auditor.Data;
using Auditor.Declaration;
using Auditor.Yaml;

namespace Auditor.Starting;

/// <summary>
/// A first declaration written from the columns of a data file. It can be audited as it stands; its author then says in it what the report says.
/// Every column that can be a term without a doubt is one, every other stands beside them as a comment with the reason.
/// </summary>
public static class FirstDeclaration
{
    /// <summary>The text of the declaration, or why the data have no such response.</summary>
    public static Reading<string> Of(IDataSource source, StartRequest request)
    {
        var header = source.ReadColumnNames();
        if (header.Value is not { } names)
        {
            return Reading<string>.Failed(header.Problems);
        }

        string[] once = [.. names.Where(name => !string.IsNullOrWhiteSpace(name)).GroupBy(name => name, StringComparer.Ordinal).Where(same => same.Count() == 1).Select(same => same.Key)];
        if (!once.Contains(request.Response, StringComparer.Ordinal))
        {
            return Refused(request, names.Contains(request.Response, StringComparer.Ordinal)
                ? $"more than one column is called '{request.Response}'"
                : $"the data have no column '{request.Response}'" + NearestName.Hint(request.Response, once));
        }

        // Read as text, no cell can be wrong, and what the cells look like is told column by column.
        var table = source.Read([.. once.Select(name => new ColumnRequest(name, ColumnKind.Levels))], DataDeclaration.DefaultMissing);
        return table.Value is { } read
            ? Of(request, [.. read.Columns.Cast<LevelsColumn>().Select(column => new ColumnProfile(column))], [.. names.Where(name => !once.Contains(name))])
            : Reading<string>.Failed(table.Problems);
    }

    private static Reading<string> Of(StartRequest request, IReadOnlyList<ColumnProfile> columns, IReadOnlyList<string> unusable)
    {
        var response = columns.Single(column => column.Name == request.Response);
        if (Fault(response) is { } fault)
        {
            return Refused(request, $"column '{response.Name}' cannot be the response: {fault}");
        }

        var others = columns.Where(column => column != response).ToList();
        return Reading<string>.Of(DeclarationText.Of(request, response, TermChoice.Of(response, others), unusable));
    }

    private static string? Fault(ColumnProfile response) =>
        response.Name == ColumnNames.Intercept || response.Texts.Count < 2 ? ColumnDoubt.Of(response)!.Reason
        : response.Kind != ColumnKind.Number ? $"its cells are no numbers but texts such as {CellText.Shown(response.Texts[0])}"
        : response.Odd.Count > 0 ? ColumnDoubt.Of(response)!.Reason
        : null;

    private static Reading<string> Refused(StartRequest request, string message) =>
        Reading<string>.Failed(new Problem(request.Source, null, message));
}
