using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Reads names of data columns and remembers every one with its place.</summary>
internal sealed class ColumnNames
{
    /// <summary>The label of the constant, so no column's.</summary>
    public const string Intercept = "intercept";

    private readonly List<ColumnMention> _mentions = [];

    public IReadOnlyList<ColumnMention> InOrder => [.. _mentions.OrderBy(mention => mention.Line)];

    /// <param name="where">As in <see cref="ColumnMention.Where"/>.</param>
    public ColumnMention? Read(Place place, string where) =>
        place.Text("a column name") is { } column ? Mention(column, place, where) : null;

    public ColumnMention? Mention(string column, Place place, string where)
    {
        if (column == Intercept)
        {
            place.Add("a column cannot be named 'intercept', which is the label of the constant; rename it in the data");
            return null;
        }

        var mention = new ColumnMention(column, place.Line, where);
        _mentions.Add(mention);
        return mention;
    }
}
