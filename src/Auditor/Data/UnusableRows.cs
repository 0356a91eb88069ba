using System.Globalization;

namespace Auditor.Data;

/// <summary>The rows that cannot be divided into the header's fields: the first ones in full, the others counted.</summary>
internal sealed class UnusableRows
{
    private readonly List<(int Line, int Row, string Fault)> _first = [];
    private int _count;

    public void Note(int line, int row, string fault)
    {
        if (_count++ < BadCells.InFull)
        {
            _first.Add((line, row, fault));
        }
    }

    /// <summary>Those of several parts of a file, in the order of the parts.</summary>
    public static IReadOnlyList<Problem> Problems(string file, IReadOnlyList<UnusableRows> parts)
    {
        List<Problem> problems = [.. from part in parts
                                     from row in part._first
                                     select new Problem(file, row.Line, string.Create(CultureInfo.InvariantCulture, $"row {row.Row}: {row.Fault}"))];
        var more = parts.Sum(part => part._count) - BadCells.InFull;
        return more <= 0 ? problems
            : [.. problems.Take(BadCells.InFull), new(file, null, string.Create(CultureInfo.InvariantCulture, $"{more} more rows that cannot be divided into fields"))];
    }
}
