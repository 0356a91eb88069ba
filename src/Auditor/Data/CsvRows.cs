using System.Globalization;
using nietras.SeparatedValues;

namespace Auditor.Data;

/// <summary>
/// One pass over the data rows: hands the fields at the wanted positions to the builders, and keeps account of rows that do not have
/// the header's number of fields. Blank lines at the end are no rows; in a file of one column a blank line before another row is an empty cell.
/// </summary>
internal sealed class CsvRows(string file, int fields, int[] positions, IReadOnlyList<ColumnBuilder> builders)
{
    private readonly List<Problem> _problems = [];
    private readonly Queue<int> _blankLines = new();
    private int _unusable;

    /// <summary>Data rows seen.</summary>
    public int Count { get; private set; }

    /// <summary>Characters in them, line ends counted as one.</summary>
    public long Characters { get; private set; }

    public static string LooseMark(ReadOnlySpan<char> field) =>
        $"found a quotation mark in the field {CellText.Shown(field)}, expected the whole field between two marks and marks inside doubled";

    /// <param name="most">Stop after so many rows.</param>
    public IReadOnlyList<Problem> Read(SepReader reader, int most)
    {
        reader.MoveNext();
        while (Count < most && reader.MoveNext())
        {
            Take(reader.Current);
        }

        return _unusable <= BadCells.InFull ? _problems : [.. _problems, More()];
    }

    private void Take(SepReader.Row row)
    {
        if (row.Span.IsEmpty)
        {
            _blankLines.Enqueue(row.LineNumberFrom);
            return;
        }

        TakeBlankLines();
        Count++;
        Characters += row.Span.Length + 1;
        var marks = row.Span.Contains('"');
        if (!marks && row.ColCount == fields)
        {
            TakeFields(row);
        }
        else if (Fault(row) is { } fault)
        {
            Refuse(row.LineNumberFrom, fault);
        }
        else
        {
            TakeQuotedFields(row);
        }
    }

    private void TakeFields(SepReader.Row row)
    {
        for (var c = 0; c < positions.Length; c++)
        {
            Add(builders[c], row[positions[c]].Span, row.LineNumberFrom);
        }
    }

    private void TakeQuotedFields(SepReader.Row row)
    {
        for (var c = 0; c < positions.Length; c++)
        {
            Add(builders[c], QuotedField.Content(row[positions[c]].Span), row.LineNumberFrom);
        }
    }

    private void Add(ColumnBuilder builder, ReadOnlySpan<char> cell, int line)
    {
        if (!builder.Add(cell))
        {
            builder.Bad.Note(line, Count, cell);
        }
    }

    private void TakeBlankLines()
    {
        while (_blankLines.TryDequeue(out var line))
        {
            Count++;
            if (fields > 1)
            {
                Refuse(line, Ragged(1));
                continue;
            }

            foreach (var builder in builders)
            {
                Add(builder, [], line);
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

    private void Refuse(int line, string fault)
    {
        if (_unusable++ < BadCells.InFull)
        {
            _problems.Add(new Problem(file, line, string.Create(CultureInfo.InvariantCulture, $"row {Count}: {fault}")));
        }
    }

    private Problem More() => new(
        file, null, string.Create(CultureInfo.InvariantCulture, $"{_unusable - BadCells.InFull} more rows that cannot be divided into fields"));
}
