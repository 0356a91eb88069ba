using System.Globalization;
using Auditor.Data;

namespace Auditor.Design;

/// <summary>
/// Values made from other rows before any row was filtered out. Missing is not the same as undefined: an earlier row that is not there, or has a missing
/// cell, gives a missing value, the log of 0 in an earlier row one that does not exist.
/// </summary>
/// <param name="name">The label of the term.</param>
/// <param name="values">One a row; NaN where missing or undefined.</param>
internal sealed class BuiltColumn(string name, double[] values, bool[] missing) : DataColumn(name)
{
    public double[] Values { get; } = values;

    public override ColumnKind Kind => ColumnKind.Number;

    public override int Length => Values.Length;

    public override bool IsMissing(int row) => missing[row];

    public override string? Text(int row) => missing[row] ? null : Values[row].ToString("R", CultureInfo.InvariantCulture);

    /// <summary>The values of a one-column term on every row of the table.</summary>
    public static BuiltColumn Of(BoundTerm term, int tableRows)
    {
        var (values, missing) = (new double[tableRows], new bool[tableRows]);
        term.Fill([.. Enumerable.Range(0, tableRows)], values, tableRows);
        for (var row = 0; row < tableRows; row++)
        {
            missing[row] = term.Sources.Any(source => source.IsMissing(row));
        }

        return new BuiltColumn(term.Term.Label, values, missing);
    }
}

/// <summary>A term whose values were built over all rows of the table.</summary>
internal sealed class BoundBuilt(Declaration.Term term, BuiltColumn built) : BoundTerm(term)
{
    public override IReadOnlyList<string> ColumnLabels { get; } = [term.Label];

    public override IReadOnlyList<DataColumn> Sources { get; } = [built];

    public override void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        for (var i = 0; i < rows.Length; i++)
        {
            into[i] = built.Values[rows[i]];
        }
    }
}
