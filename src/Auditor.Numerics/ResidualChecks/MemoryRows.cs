using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>A design without an intercept held in memory: columns of one length, and the response.</summary>
internal sealed class MemoryRows(double[][] columns, double[] response) : IDesignRows
{
    public DesignLayout Layout { get; } = new(false, columns.Length, []);

    public IEnumerable<RowBlock> Blocks()
    {
        var block = new RowBlock(RowBlock.DefaultCapacity, columns.Length + 1);
        for (var first = 0; first < response.Length; first += block.Stride)
        {
            block.FirstRow = first;
            block.Rows = Math.Min(block.Stride, response.Length - first);
            for (var c = 0; c <= columns.Length; c++)
            {
                (c < columns.Length ? columns[c] : response).AsSpan(first, block.Rows).CopyTo(block.Column(c));
            }

            yield return block;
        }
    }
}
