using System.Runtime.Intrinsics;
using Auditor.Data;
using Auditor.Numerics.Factor;

namespace Auditor.Rows;

/// <summary>Where a column has no value, and whether it has one too large to compute with.</summary>
/// <param name="Missing">Null when every row has a value.</param>
internal sealed record ColumnGaps(RowBits? Missing, bool HasTooLarge)
{
    private const int Lanes = 8;

    /// <summary>All columns in one look at their cells.</summary>
    public static Dictionary<DataColumn, ColumnGaps> Find(IReadOnlyList<DataColumn> columns, int rows, int threads)
    {
        var (bits, large) = (columns.Select(_ => new RowBits(rows)).ToArray(), new bool[columns.Count]);
        RowRanges.Each(rows, threads, (first, count) =>
        {
            for (var c = 0; c < columns.Count; c++)
            {
                if (Look(columns[c], first, count, bits[c]))
                {
                    large[c] = true;
                }
            }
        });
        return columns.Index().ToDictionary(
            column => column.Item, column => new ColumnGaps(bits[column.Index].IsEmpty ? null : bits[column.Index], large[column.Index]));
    }

    /// <returns>Whether one of the values is too large.</returns>
    private static bool Look(DataColumn column, int first, int count, RowBits missing)
    {
        if (column is NumberColumn numbers)
        {
            return LookAtNumbers(numbers, first, count, missing);
        }

        for (var row = first; row < first + count; row++)
        {
            if (column.IsMissing(row))
            {
                missing.Set(row);
            }
        }

        return false;
    }

    private static bool LookAtNumbers(NumberColumn column, int first, int count, RowBits missing)
    {
        Span<double> values = stackalloc double[RowBits.WordRows];
        var large = Vector512<double>.Zero;
        for (var done = 0; done < count; done += RowBits.WordRows)
        {
            var length = Math.Min(RowBits.WordRows, count - done);
            values[length..].Clear();
            column.Values.Read(first + done, values[..length]);
            var word = 0UL;
            for (var lane = 0; lane < RowBits.WordRows; lane += Lanes)
            {
                var eight = Vector512.Create<double>(values.Slice(lane, Lanes));
                word |= (ulong)(byte)~Vector512.Equals(eight, eight).ExtractMostSignificantBits() << lane;
                large |= Vector512.GreaterThanOrEqual(Vector512.Abs(eight), Vector512.Create(OrthogonalFactor.LargestValue));
            }

            missing.Words[(first + done) / RowBits.WordRows] = word;
        }

        return large.ExtractMostSignificantBits() != 0;
    }
}
