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

    public List<int> Incomplete { get; } = [];

    public List<int> Undefined { get; } = [];

    /// <summary>Rows that each term leaves undefined, by the term's label.</summary>
    public Dictionary<string, int> UndefinedByTerm { get; } = new(StringComparer.Ordinal);

    public IReadOnlyCollection<int> Both => Undefined.Count == 0 ? Incomplete : [.. Incomplete, .. Undefined];

    /// <param name="required">Columns that must have a value beside those of the terms.</param>
    public static TermGaps Find(IReadOnlyList<BoundTerm> terms, RowSubset rows, IReadOnlyList<DataColumn> required)
    {
        var gaps = new TermGaps();
        var sources = terms.SelectMany(term => term.Sources).Concat(required).Distinct().ToArray();
        var complete = new List<int>(rows.Count);
        foreach (var row in rows.Rows)
        {
            (Array.Exists(sources, source => source.IsMissing(row)) ? gaps.Incomplete : complete).Add(row);
        }

        gaps.FindUndefined(terms, [.. complete]);
        return gaps;
    }

    private void FindUndefined(IReadOnlyList<BoundTerm> terms, int[] rows)
    {
        var undefined = new SortedSet<int>();
        foreach (var term in terms.Where(term => term.ColumnLabels.Count > 0))
        {
            var own = Undefineds(term, rows);
            undefined.UnionWith(own);
            if (own.Count > 0)
            {
                UndefinedByTerm[term.Term.Label] = own.Count;
            }
        }

        Undefined.AddRange(undefined);
    }

    private static List<int> Undefineds(BoundTerm term, int[] rows)
    {
        var (found, values) = (new List<int>(), new double[BlockRows * term.ColumnLabels.Count]);
        for (var first = 0; first < rows.Length; first += BlockRows)
        {
            var block = rows.AsSpan(first, Math.Min(BlockRows, rows.Length - first));
            term.Fill(block, values, BlockRows);
            for (var i = 0; i < block.Length; i++)
            {
                if (!IsDefined(values, i, term.ColumnLabels.Count))
                {
                    found.Add(block[i]);
                }
            }
        }

        return found;
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
