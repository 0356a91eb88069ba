using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>One column whose value in a row follows from the row's cell of one data column.</summary>
internal sealed class BoundCell(Term term, DataColumn source, Func<int, double> value) : BoundTerm(term)
{
    public override IReadOnlyList<string> ColumnLabels { get; } = [term.Label];

    public override IReadOnlyList<DataColumn> Sources { get; } = [source];

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        for (var i = 0; i < rows.Length; i++)
        {
            into[i] = value(rows[i]);
        }
    }
}

/// <summary>A number column as it is.</summary>
internal sealed class BoundNumber(ColumnTerm term, NumberColumn source) : BoundTerm(term)
{
    public override IReadOnlyList<string> ColumnLabels { get; } = [term.Label];

    public override IReadOnlyList<DataColumn> Sources { get; } = [source];

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride) => source.Values.Read(rows, into);
}

/// <summary>Columns of 0 and 1, at most one of them 1 in a row (treatment coding).</summary>
/// <param name="columnOf">The column that is 1 in a row; negative for none: the reference, or no value.</param>
internal sealed class BoundDummies(Term term, DataColumn source, IReadOnlyList<string> labels, Func<int, int> columnOf) : BoundTerm(term)
{
    public override IReadOnlyList<string> ColumnLabels { get; } = labels;

    public override IReadOnlyList<DataColumn> Sources { get; } = [source];

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        for (var c = 0; c < ColumnLabels.Count; c++)
        {
            into.Slice(c * stride, rows.Length).Clear();
        }

        for (var i = 0; i < rows.Length; i++)
        {
            if (columnOf(rows[i]) is >= 0 and var column)
            {
                into[(column * stride) + i] = 1;
            }
        }
    }
}
