using System.Globalization;
using nietras.SeparatedValues;

namespace Auditor.Data;

/// <summary>
/// Consecutive data rows: hands the fields at the wanted positions to the parts of columns, and keeps account of rows that do not have
/// the header's number of fields. Blank lines at the end are no rows; in a file of one column a blank line before another row is an empty cell.
/// </summary>
/// <param name="before">Data rows before these.</param>
/// <param name="linesBefore">Lines before what is read here.</param>
internal sealed class CsvRows(int fields, int[] positions, ColumnPart[] parts, int before = 0, int linesBefore = 0)
{
    private readonly Queue<int> _blankLines = new();
    private bool _started;

    /// <summary>Data rows seen.</summary>
    public int Count { get; private set; }

    /// <summary>Characters in them, line ends counted as one.</summary>
    public long Characters { get; private set; }

    public UnusableRows Unusable { get; } = new();

    private int Row => before + Count - 1;

    public static string LooseMark(ReadOnlySpan<char> field) =>
        $"found a quotation mark in the field {CellText.Shown(field)}, expected the whole field between two marks and marks inside doubled";

    /// <param name="header">Whether the header comes first.</param>
    /// <param name="most">Stop after so many rows.</param>
    public void Read(SepReader reader, bool header, int most = int.MaxValue)
    {
        _started = header && reader.MoveNext();

        while (Count < most && reader.MoveNext())
        {
            Take(reader.Current);
        }
    }

    private void Take(SepReader.Row row)
    {
        // The reader of fields says 2 for the row it starts with, header or not.
        var line = linesBefore + (_started ? row.LineNumberFrom : 1);
        _started = true;
        if (row.Span.IsEmpty)
        {
            _blankLines.Enqueue(line);
            return;
        }

        TakeBlankLines();
        Count++;
        Characters += row.Span.Length + 1;
        var marks = row.Span.Contains('"');
        if (!marks && row.ColCount == fields)
        {
            TakeFields(row, line);
        }
        else if (Fault(row) is { } fault)
        {
            Unusable.Note(line, Row + 1, fault);
        }
        else
        {
            TakeQuotedFields(row, line);
        }
    }

    private void TakeFields(SepReader.Row row, int line)
    {
        for (var c = 0; c < positions.Length; c++)
        {
            Set(parts[c], row[positions[c]].Span, line);
        }
    }

    private void TakeQuotedFields(SepReader.Row row, int line)
    {
        for (var c = 0; c < positions.Length; c++)
        {
            Set(parts[c], QuotedField.Content(row[positions[c]].Span), line);
        }
    }

    private void Set(ColumnPart part, ReadOnlySpan<char> cell, int line)
    {
        if (!part.Set(Row, cell))
        {
            part.Bad.Note(line, Row + 1, cell);
        }
    }

    private void TakeBlankLines()
    {
        while (_blankLines.TryDequeue(out var line))
        {
            Count++;
            if (fields > 1)
            {
                Unusable.Note(line, Row + 1, Ragged(1));
                continue;
            }

            foreach (var part in parts)
            {
                Set(part, [], line);
            }
        }
    }

    private string? Fault(SepReader.Row row)
    {
        for (var i = 0; i < row.ColCount; i++)
        {
            if (!QuotedField.IsWellFormed(row[i].Span))
            {
                return LooseMark(row[i].Span);
            }
        }

        return row.ColCount == fields ? null : Ragged(row.ColCount);
    }

    private string Ragged(int found) => string.Create(
        CultureInfo.InvariantCulture, $"found {found} {(found == 1 ? "field" : "fields")}, expected {fields} as in the header");
}
