using Auditor.Data;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Holds the columns that a declaration names against the columns of the data.</summary>
public static class ColumnCheck
{
    /// <summary>One problem for each mention of a column that the data do not have, or have more than once.</summary>
    public static IReadOnlyList<Problem> Problems(string file, IReadOnlyList<ColumnMention> mentions, IReadOnlyList<string> columns)
    {
        string[] named = [.. columns.Where(column => !string.IsNullOrWhiteSpace(column)).Distinct(StringComparer.Ordinal)];
        var problems = from mention in mentions
                       let fault = Fault(mention.Column, columns, named)
                       where fault is not null
                       select new Problem(file, mention.Line, mention.Where + ": " + fault);
        return [.. problems.Distinct()];
    }

    /// <summary>What to read: every mentioned column once, with its declared kind; a row label is text.</summary>
    public static IReadOnlyList<ColumnRequest> Requests(ModelDeclaration declaration, IReadOnlyList<ColumnMention> mentions) =>
        [.. mentions
            .Select(mention => mention.Column)
            .Distinct(StringComparer.Ordinal)
            .Select(column => new ColumnRequest(column, Kind(declaration, mentions, column)))];

    private static string? Fault(string column, IReadOnlyList<string> columns, IReadOnlyCollection<string> named) => CsvHeader.Places(columns, column) switch
    {
        [] => $"the data have no column '{column}'" + NearestName.Hint(column, named),
        [_] => null,
        var places => CsvHeader.Repeated(column, places) + "; rename one of them in the data",
    };

    private static ColumnKind? Kind(ModelDeclaration declaration, IReadOnlyList<ColumnMention> mentions, string column)
    {
        if (declaration.Data.Columns.GetValueOrDefault(column)?.Kind is { } declared)
        {
            return declared;
        }

        var onlyLabel = declaration.Data.RowLabel?.Column == column && mentions.Count(mention => mention.Column == column) == 1;
        return onlyLabel ? ColumnKind.Text : null;
    }
}
