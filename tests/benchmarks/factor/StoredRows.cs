using Auditor.Numerics.Factor;

namespace Auditor.Benchmarks.Factor;

/// <summary>A design of normal-like numbers held in memory block by block, so that only the factorisation is timed.</summary>
internal sealed class StoredRows : IDesignRows
{
    private readonly RowBlock[] _blocks;
    private readonly RowStripes _stripes;

    public StoredRows(int rows, int columns)
    {
        Layout = new DesignLayout(true, columns, []);
        _stripes = new RowStripes(rows, Layout.Columns);
        _blocks = [.. Enumerable.Range(0, (rows + RowBlock.DefaultCapacity - 1) / RowBlock.DefaultCapacity).Select(at => Block(at * RowBlock.DefaultCapacity, rows))];
    }

    public DesignLayout Layout { get; }

    public int Stripes => _stripes.Count;

    public IEnumerable<RowBlock> Blocks() => _blocks;

    public IEnumerable<RowBlock> Blocks(int stripe)
    {
        var (first, end) = _stripes[stripe];
        return new ArraySegment<RowBlock>(
            _blocks, first / RowBlock.DefaultCapacity, ((end + RowBlock.DefaultCapacity - 1) / RowBlock.DefaultCapacity) - (first / RowBlock.DefaultCapacity));
    }

    /// <summary>The columns one after another, as LAPACK wants them.</summary>
    public double[] ColumnMajor(int rows)
    {
        var all = new double[(long)rows * Layout.Columns];
        foreach (var block in _blocks)
        {
            for (var c = 0; c < Layout.Columns; c++)
            {
                block.Column(c).CopyTo(all.AsSpan((c * rows) + block.FirstRow));
            }
        }

        return all;
    }

    private RowBlock Block(int first, int rows)
    {
        var block = new RowBlock(RowBlock.DefaultCapacity, Layout.Columns) { FirstRow = first, Rows = Math.Min(RowBlock.DefaultCapacity, rows - first) };
        block.Column(0).Fill(1);
        for (var c = 1; c < Layout.Columns; c++)
        {
            for (var i = 0; i < block.Rows; i++)
            {
                block.Column(c)[i] = Number((ulong)(first + i), (ulong)c);
            }
        }

        return block;
    }

    /// <summary>A number between -1 and 1 from a mixed-up counter.</summary>
    private static double Number(ulong row, ulong column)
    {
        var z = ((row * 4096) + column + 1) * 0x9E3779B97F4A7C15;
        z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
        return ((z ^ (z >> 31)) / (double)ulong.MaxValue * 2) - 1;
    }
}
