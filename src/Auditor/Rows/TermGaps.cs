using System.Numerics;
using Auditor.Data;
using Auditor.Design;
using Auditor.Numerics.Factor;

namespace Auditor.Rows;

/// <summary>
/// Where some terms have no value: rows with a missing source, and rows where a transform has none, or one too large to compute with, although its
/// sources do.
/// </summary>
internal sealed class TermGaps
{
    private const int BlockRows = 1024;

    private TermGaps(RowBits? incomplete) => Incomplete = incomplete;

    /// <summary>Null when there is no such row.</summary>
    public RowBits? Incomplete { get; }

    /// <summary>Null when there is no such row.</summary>
    public RowBits? Undefined { get; private set; }

    /// <summary>Rows that each term leaves undefined, by the term's label.</summary>
    public Dictionary<string, int> UndefinedByTerm { get; } = new(StringComparer.Ordinal);

    /// <param name="required">Columns that must have a value beside those of the terms.</param>
    /// <param name="gaps">Those of every column in question.</param>
    public static TermGaps Find(
        IReadOnlyList<BoundTerm> terms, RowSubset rows, IReadOnlyList<DataColumn> required, IReadOnlyDictionary<DataColumn, ColumnGaps> gaps, int threads)
    {
        var missing = Union(terms.SelectMany(term => term.Sources).Concat(required).Distinct().Select(source => gaps[source].Missing))?.And(rows.Bits);
        var found = new TermGaps(missing is { IsEmpty: false } ? missing : null);
        var complete = found.Incomplete is { } incomplete ? rows.Bits.Without(incomplete) : rows.Bits;
        foreach (var term in terms.Where(term => term.ColumnLabels.Count > 0 && MayBeUndefined(term, gaps)))
        {
            found.Take(term, UndefinedRows(term, complete, threads));
        }

        return found;
    }

    /// <summary>The rows without a value, those of all given ones together; null when there are none.</summary>
    public static RowBits? Union(IEnumerable<RowBits?> all) => all.OfType<RowBits>().Aggregate((RowBits?)null, (sum, bits) => sum is null ? bits : sum.Or(bits));

    /// <summary>These rows without the gaps.</summary>
    public RowSubset Complete(RowSubset rows) => Union([Incomplete, Undefined]) is { } gaps ? rows.Without(gaps) : rows;

    private static bool MayBeUndefined(BoundTerm term, IReadOnlyDictionary<DataColumn, ColumnGaps> gaps) => term switch
    {
        BoundNumber => gaps[term.Sources[0]].HasTooLarge,
        BoundDummies => false,
        _ => true,
    };

    private void Take(BoundTerm term, RowBits undefined)
    {
        if (undefined.Count is > 0 and var count)
        {
            UndefinedByTerm[term.Term.Label] = count;
            Undefined = Union([Undefined, undefined]);
        }
    }

    private static RowBits UndefinedRows(BoundTerm term, RowBits within, int threads)
    {
        var found = new RowBits(within.Rows);
        RowRanges.Each(within.Rows, threads, (first, count) =>
        {
            var (rows, values) = (new int[BlockRows], new double[BlockRows * term.ColumnLabels.Count]);
            for (var from = first; from < first + count; from += BlockRows)
            {
                Mark(term, rows.AsSpan(0, RowsOf(within, from, Math.Min(BlockRows, first + count - from), rows)), values, found);
            }
        });
        return found;
    }

    /// <summary>The rows of a range that are wanted; returns how many.</summary>
    private static int RowsOf(RowBits within, int first, int count, int[] rows)
    {
        var found = 0;
        for (var row = first; row < first + count; row += RowBits.WordRows)
        {
            for (var word = within.Words[row / RowBits.WordRows]; word != 0; word &= word - 1)
            {
                rows[found++] = row + BitOperations.TrailingZeroCount(word);
            }
        }

        return found;
    }

    private static void Mark(BoundTerm term, ReadOnlySpan<int> rows, double[] values, RowBits found)
    {
        term.Fill(rows, values, BlockRows);
        for (var i = 0; i < rows.Length; i++)
        {
            if (!IsDefined(values, i, term.ColumnLabels.Count))
            {
                found.Set(rows[i]);
            }
        }
    }

    private static bool IsDefined(double[] values, int row, int columns)
    {
        for (var c = 0; c < columns; c++)
        {
            if (!(Math.Abs(values[(c * BlockRows) + row]) < OrthogonalFactor.LargestValue))
            {
                return false;
            }
        }

        return true;
    }
}
