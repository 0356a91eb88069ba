using System.Globalization;
using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>Binds the declared split: the first part goes up to and includes the row, or the value, that was declared.</summary>
/// <param name="refuse">Takes a problem at a line.</param>
internal sealed class SplitBinding(DataTable table, RowSubset keptRows, Action<int?, string> refuse)
{
    private const string Key = "data.split: ";

    public BoundSplit? Of(SplitDeclaration declared) => declared.Row is int row ? AtRow(row, declared.Line) : AtValue(declared);

    private BoundSplit? AtRow(int last, int line)
    {
        if (last >= table.RowCount)
        {
            refuse(line, string.Create(
                CultureInfo.InvariantCulture,
                $"{Key}the first part ends at row {last:#,0}, and the data have {table.RowCount:#,0} rows: nothing is left for the second part"));
            return null;
        }

        var label = string.Create(CultureInfo.InvariantCulture, $"row {last}");
        return Checked(new BoundSplit(label, _ => true, row => row < last), line, "");
    }

    private BoundSplit? AtValue(SplitDeclaration declared)
    {
        var column = table[declared.Column!];
        var position = CellTest.Position(column);
        var fault = position is null
            ? $"column {column.Name} holds {column.Kind.ToString().ToLowerInvariant()}, a split needs dates or numbers, or a row" + Instead(column)
            : CellTest.Fault(column, declared.At!);
        if (fault is not null)
        {
            refuse(declared.Line, Key + fault);
            return null;
        }

        var at = CellTest.PositionOf(column, declared.At!);
        return Checked(
            new BoundSplit($"{column.Name} {declared.At}", row => !column.IsMissing(row), row => position!(row) <= at), declared.Line, Range(column, position!));
    }

    private static string Instead(DataColumn column) =>
        column.Kind == ColumnKind.Levels ? $"; to test every group in each of its values, use data.segments: [{column.Name}]" : "";

    private BoundSplit? Checked(BoundSplit split, int line, string range)
    {
        var parts = split.Among(keptRows);
        if (parts.First > 0 && parts.Second > 0)
        {
            return split;
        }

        refuse(line, $"{Key}the first part ends at {split.Label}, which leaves no kept row in the {(parts.First == 0 ? "first" : "second")} part{range}");
        return null;
    }

    private string Range(DataColumn column, Func<int, double> position)
    {
        int[] rows = [.. keptRows.Where(row => !column.IsMissing(row)).OrderBy(position)];
        return rows.Length == 0 ? "" : $"; {column.Name} runs from {column.Text(rows[0])} to {column.Text(rows[^1])} there";
    }
}
