using Auditor.Data;

namespace Auditor.Rows;

/// <summary>Cuts the rows of a table into ranges of whole words of <see cref="RowBits"/>, so that threads can set bits without meeting.</summary>
internal static class RowRanges
{
    private const int RangeRows = 1 << 14;

    /// <param name="work">Is given the first row of a range and how many rows it has.</param>
    public static void Each(int rows, int threads, Action<int, int> work)
    {
        var ranges = (rows + RangeRows - 1) / RangeRows;
        void Range(int range) => work(range * RangeRows, Math.Min(RangeRows, rows - (range * RangeRows)));
        if (threads <= 1 || ranges == 1)
        {
            for (var range = 0; range < ranges; range++)
            {
                Range(range);
            }

            return;
        }

        Parallel.For(0, ranges, new ParallelOptions { MaxDegreeOfParallelism = threads }, Range);
    }
}
