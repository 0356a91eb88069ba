using System.Globalization;

namespace Auditor.Reporting.Html;

/// <summary>One column of a table over items of a kind.</summary>
internal sealed record Column<T>(string Heading, string Kind, Func<T, Cell> Cell);

/// <summary>A table ready to be set: headings, cells, and below it the reasons of the missing ones.</summary>
internal sealed record ReportTable(string Caption, IReadOnlyList<Heading> Headings, IReadOnlyList<IReadOnlyList<Cell>> Rows, IReadOnlyList<TableNote> Notes)
{
    public static ReportTable Of<T>(string caption, IEnumerable<T> items, params IReadOnlyList<Column<T>> columns)
    {
        var notes = new List<TableNote>();
        Cell[][] rows = [.. items.Select(item => columns.Select(column => Noted(column.Cell(item), column.Kind, notes)).ToArray())];
        return new(caption, [.. columns.Select(column => new Heading(column.Heading, column.Kind))], rows, notes);
    }

    private static Cell Noted(Cell cell, string kind, List<TableNote> notes)
    {
        if (cell.Why is null)
        {
            return cell;
        }

        TableNote? known = notes.Find(note => note.Text == cell.Why);
        if (known is null)
        {
            notes.Add(known = new(Letter(notes.Count), cell.Why));
        }

        return cell with { Note = known.Letter, Kind = kind };
    }

    /// <summary>a to z, then a2 and so on.</summary>
    private static string Letter(int index) =>
        (char)('a' + (index % 26)) + (index < 26 ? "" : ((index / 26) + 1).ToString(CultureInfo.InvariantCulture));
}

internal sealed record Heading(string Text, string Kind);

internal sealed record TableNote(string Letter, string Text);
