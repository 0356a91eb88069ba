using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Tests;

/// <summary>A design held in memory: the final model's columns, groups of columns, the response; blocks of any size.</summary>
internal sealed class MatrixDesign(
    bool intercept, double[][] final, double[][][] groups, double[] response, double[]? weights = null, double[]? copies = null, int blockRows = 7)
    : IDesignRows
{
    private readonly double[][] _columns =
    [
        .. intercept ? new[] { Enumerable.Repeat(1.0, response.Length).ToArray() } : [],
        .. final,
        .. groups.SelectMany(group => group),
        response,
    ];

    public DesignLayout Layout { get; } = new(intercept, final.Length + (intercept ? 1 : 0), Ranges(intercept, final, groups));

    public IEnumerable<RowBlock> Blocks()
    {
        var block = new RowBlock(blockRows, _columns.Length);
        for (var first = 0; first < response.Length; first += blockRows)
        {
            block.FirstRow = first;
            block.Rows = Math.Min(blockRows, response.Length - first);
            for (var c = 0; c < _columns.Length; c++)
            {
                _columns[c].AsSpan(first, block.Rows).CopyTo(block.Column(c));
            }

            block.Weights = weights?.AsSpan(first, block.Rows).ToArray();
            block.Copies = copies?.AsSpan(first, block.Rows).ToArray();
            yield return block;
        }
    }

    private static List<ColumnRange> Ranges(bool intercept, double[][] final, double[][][] groups)
    {
        var (start, ranges) = (final.Length + (intercept ? 1 : 0), new List<ColumnRange>());
        foreach (var group in groups)
        {
            ranges.Add(new ColumnRange(start, group.Length));
            start += group.Length;
        }

        return ranges;
    }
}
