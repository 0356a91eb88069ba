using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>
/// A term bound to the data: its kinds, levels, means and limits are fixed, and it can make its columns for any rows.
/// Everything data-dependent was settled when it was bound and is reused for every subset of rows.
/// </summary>
public abstract class BoundTerm(Term term)
{
    /// <summary>The declared term.</summary>
    public Term Term { get; } = term;

    /// <summary>One label for each column it makes, as in the record.</summary>
    public abstract IReadOnlyList<string> ColumnLabels { get; }

    /// <summary>The data columns that must have a value in a row for the term to have one; a row where one is missing is incomplete.</summary>
    public abstract IReadOnlyList<DataColumn> Sources { get; }

    /// <summary>
    /// Writes the term's columns for the given rows: column c, row i at <c>into[c * stride + i]</c>.
    /// A value that does not exist although the sources do (the log of 0) is NaN or infinite: the row is then undefined for the term.
    /// What stands in rows with a missing source is not specified, but no exception is thrown for them.
    /// </summary>
    public abstract void Fill(ReadOnlySpan<int> rows, Span<double> into, int stride);

    /// <summary>Whether the term knows what rounding took off its values.</summary>
    public virtual bool HasLowParts => false;

    /// <summary>
    /// Writes what rounding took off each value of <see cref="Fill"/>, laid out alike: value plus low part is the number declared, taking the values that the term is made of
    /// as exact. Zeros for terms that do not know.
    /// </summary>
    public virtual void FillLow(ReadOnlySpan<int> rows, Span<double> into, int stride)
    {
        for (var c = 0; c < ColumnLabels.Count; c++)
        {
            into.Slice(c * stride, rows.Length).Clear();
        }
    }
}
