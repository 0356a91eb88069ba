using Auditor.Numerics.Factor;

namespace Auditor.Simulation;

/// <summary>A design that stays in memory as the blocks of rows that the passes read; single columns are rewritten between draws.</summary>
internal sealed class MemoryRows : IDesignRows
{
    private readonly RowBlock[] _blocks;

    public MemoryRows(DesignLayout layout, int rows)
    {
        Layout = layout;
        _blocks =
        [
            .. Enumerable.Range(0, (rows + RowBlock.DefaultCapacity - 1) / RowBlock.DefaultCapacity).Select(block => new RowBlock(RowBlock.DefaultCapacity, layout.Columns)
            {
                FirstRow = block * RowBlock.DefaultCapacity,
                Rows = Math.Min(RowBlock.DefaultCapacity, rows - (block * RowBlock.DefaultCapacity)),
            }),
        ];
    }

    public DesignLayout Layout { get; }

    public IEnumerable<RowBlock> Blocks() => _blocks;

    public void Set(int column, ReadOnlySpan<double> values)
    {
        foreach (var block in _blocks)
        {
            values.Slice(block.FirstRow, block.Rows).CopyTo(block.Column(column));
        }
    }
}
