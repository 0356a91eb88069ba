using Auditor.Data;

namespace Auditor.Design;

/// <summary>Cells as numbers that are equal when the cells are and that put them in order; NaN for a missing one.</summary>
internal static class ColumnKeys
{
    /// <summary>One key a row: the number, the day, or the place of the text among the column's texts (by value when all are numbers, else by code point).</summary>
    public static double[] Of(DataColumn column) => column switch
    {
        NumberColumn numbers => numbers.Values.ToArray(),
        DateColumn dates => [.. dates.Days.Select(day => day == DateColumn.Missing ? double.NaN : day)],
        LevelsColumn levels => Levels(levels),
        _ => Texts(column),
    };

    private static double[] Levels(LevelsColumn column)
    {
        var places = Places(column.Texts);
        double[] ofCode = [.. column.Texts.Select(text => (double)places[text])];
        return [.. column.Codes.Select(code => code < 0 ? double.NaN : ofCode[code])];
    }

    private static double[] Texts(DataColumn column)
    {
        string?[] cells = [.. Enumerable.Range(0, column.Length).Select(column.Text)];
        var places = Places([.. cells.OfType<string>().Distinct(StringComparer.Ordinal)]);
        return [.. cells.Select(cell => cell is null ? double.NaN : places[cell])];
    }

    private static Dictionary<string, int> Places(IReadOnlyList<string> texts) =>
        CodePointOrder.Sort(texts).Index().ToDictionary(pair => pair.Item, pair => pair.Index, StringComparer.Ordinal);
}
