using System.Globalization;

namespace Auditor.Data;

/// <summary>The cells of one column that cannot be used: the first ones in full, the others counted.</summary>
internal sealed class BadCells
{
    /// <summary>How many are named one by one.</summary>
    public const int InFull = 10;

    private readonly List<(int? Line, int Row, string Shown)> _first = [];
    private int _count;

    public void Note(int? line, int row, ReadOnlySpan<char> cell)
    {
        if (_count++ < InFull)
        {
            _first.Add((line, row, CellText.Shown(cell)));
        }
    }

    /// <summary>The bad cells of several parts of a column, in the order of the parts.</summary>
    public static BadCells Joined(IEnumerable<BadCells> parts)
    {
        var joined = new BadCells();
        foreach (var part in parts)
        {
            joined._first.AddRange(part._first.Take(InFull - joined._first.Count));
            joined._count += part._count;
        }

        return joined;
    }

    /// <param name="kind">What the cells should have read as.</param>
    public IEnumerable<Problem> Problems(string file, string column, ColumnKind kind)
    {
        var expected = kind == ColumnKind.Date ? "a date as YYYY-MM-DD" : "a finite number";
        foreach (var (line, row, shown) in _first)
        {
            yield return new Problem(file, line, string.Create(CultureInfo.InvariantCulture, $"row {row}, column {column}: found {shown}, expected {expected}; {WaysOut(column)}"));
        }

        if (_count > InFull)
        {
            yield return new Problem(file, null, string.Create(CultureInfo.InvariantCulture, $"column {column}: {_count - InFull} more cells that are not {expected}"));
        }
    }

    private static string WaysOut(string column) =>
        $"declare {column} with kind: levels if its cells are names, or put the text under missing if it means no value";
}
