using Auditor.Data;

namespace Auditor.Design;

/// <summary>
/// Tests of one cell against a value as written in the declaration: numerically on a number column, by day on a date column, else by text.
/// A missing cell passes none.
/// </summary>
internal static class CellTest
{
    /// <summary>Why the value cannot be compared with the column's cells; null when it can.</summary>
    public static string? Fault(DataColumn column, string value) => column switch
    {
        NumberColumn when !CellText.TryNumber(value, out _) => $"column {column.Name} holds numbers, found {CellText.Shown(value)}",
        DateColumn when !CellText.TryDay(value, out _) => $"column {column.Name} holds dates, found {CellText.Shown(value)}, expected YYYY-MM-DD",
        _ => null,
    };

    /// <summary>Whether a row's cell equals the value, which has no fault.</summary>
    public static Func<int, bool> Equal(DataColumn column, string value)
    {
        switch (column)
        {
            case NumberColumn numbers when CellText.TryNumber(value, out var number):
                return row => numbers.Values[row] == number;
            case DateColumn dates when CellText.TryDay(value, out var day):
                return row => dates.Days[row] == day;
            case LevelsColumn levels:
                var code = levels.Texts.ToList().IndexOf(value);
                return row => code >= 0 && levels.Codes[row] == code;
            default:
                return row => string.Equals(column.Text(row), value, StringComparison.Ordinal);
        }
    }

    /// <summary>The cells of a number or date column as numbers that keep their order, NaN where missing; null for other kinds.</summary>
    public static Func<int, double>? Position(DataColumn column) => column switch
    {
        NumberColumn numbers => row => numbers.Values[row],
        DateColumn dates => row => dates.IsMissing(row) ? double.NaN : dates.Days[row],
        _ => null,
    };

    /// <summary>A value, which has no fault, on the same scale.</summary>
    public static double PositionOf(DataColumn column, string value)
    {
        if (column is DateColumn)
        {
            return CellText.TryDay(value, out var day) ? day : double.NaN;
        }

        return CellText.TryNumber(value, out var number) ? number : double.NaN;
    }
}
