using System.Globalization;
using Auditor.Data;
using Auditor.Design;

namespace Auditor.Starting;

/// <summary>A column as a term of the first declaration.</summary>
/// <param name="Doubt">Why it stands there as a comment only; null: it is a term.</param>
/// <param name="Note">What stands beside it.</param>
internal sealed record TermChoice(ColumnProfile Column, ColumnDoubt? Doubt, string Note)
{
    /// <summary>A first declaration leaves at least so many rows for each coefficient, so that it can be audited as it stands. Our own choice.</summary>
    private const int RowsForEachCoefficient = 5;

    /// <summary>The columns other than the response, in order: a term when there is no doubt about it and enough rows have every value.</summary>
    public static IReadOnlyList<TermChoice> Of(ColumnProfile response, IEnumerable<ColumnProfile> others)
    {
        var choices = new List<TermChoice>();
        var complete = Enumerable.Range(0, response.Rows).Where(response.HasValue).ToArray();
        var coefficients = 1;
        foreach (var column in others)
        {
            var doubt = ColumnDoubt.Of(column);
            var left = doubt is null ? complete.Where(column.HasValue).ToArray() : complete;
            var more = coefficients + column.ModelColumns;
            doubt ??= !column.Varies(left) ? new ColumnDoubt("the same value in every row that has a value of all columns above and of the response")
                : left.Length < RowsForEachCoefficient * more ? TooFew(left.Length, more)
                : null;
            (complete, coefficients) = doubt is null ? (left, more) : (complete, coefficients);
            choices.Add(new TermChoice(column, doubt, doubt?.Reason ?? Described(column)));
        }

        return choices;
    }

    /// <summary>What a column without doubts holds.</summary>
    public static string Described(ColumnProfile column)
    {
        var values = column.Kind == ColumnKind.Number
            ? string.Create(CultureInfo.InvariantCulture, $"number, {column.Numbers.Min():G6} to {column.Numbers.Max():G6}")
            : "levels: " + Levels([.. CodePointOrder.Sort(column.Texts)]);
        return column.Missing == 0 ? values : string.Create(CultureInfo.InvariantCulture, $"{values}; no value in {column.Missing} of {column.Rows} rows");
    }

    private static string Levels(IReadOnlyList<string> levels) =>
        $"{CellText.Shown(levels[0])} (the reference), {string.Join(", ", levels.Skip(1).Select(level => CellText.Shown(level)))}";

    private static ColumnDoubt TooFew(int rows, int coefficients) =>
        new(string.Create(CultureInfo.InvariantCulture, $"with it, only {rows} rows have every value, for {coefficients} coefficients"));
}
