using Auditor.Data;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Holds the columns that a declaration names against the columns of the data.</summary>
public static class ColumnCheck
{
    /// <summary>One problem for each mention of a column that the data do not have.</summary>
    public static IReadOnlyList<Problem> Unknown(string file, IReadOnlyList<ColumnMention> mentions, IReadOnlyList<string> columns)
    {
        var known = columns.ToHashSet(StringComparer.Ordinal);
        return [.. mentions
            .Where(mention => !known.Contains(mention.Column))
            .Select(mention => new Problem(
                file, mention.Line, $"{mention.Where}: the data have no column '{mention.Column}'" + NearestName.Hint(mention.Column, columns)))
            .Distinct()];
    }

    /// <summary>What to read: every mentioned column once, with its declared kind; a row label is text.</summary>
    public static IReadOnlyList<ColumnRequest> Requests(ModelDeclaration declaration, IReadOnlyList<ColumnMention> mentions) =>
        [.. mentions
            .Select(mention => mention.Column)
            .Distinct(StringComparer.Ordinal)
            .Select(column => new ColumnRequest(column, Kind(declaration, mentions, column)))];

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
