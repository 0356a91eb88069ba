using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>The rows of one group's orthonormal Qz for a block, with residual and leverage of F + group.</summary>
internal sealed class GroupRows(AddedGroup group, int capacity)
{
    private readonly double[] _qz = new double[capacity * Math.Max(1, group.Rank)];
    private readonly double[] _residuals = new double[capacity];
    private readonly double[] _fitted = new double[capacity];
    private readonly double[] _squares = new double[capacity];
    private int _rows;

    public Span<double> Column(int k) => _qz.AsSpan(k * capacity, _rows);

    /// <summary>e(F + group) = e(F) - Qz u.</summary>
    public ReadOnlySpan<double> Residuals => _residuals.AsSpan(0, _rows);

    /// <summary>The group's own fitted part Qz u.</summary>
    public ReadOnlySpan<double> Fitted => _fitted.AsSpan(0, _rows);

    /// <summary>|qz|² of each row: h(F + group) - h(F).</summary>
    public ReadOnlySpan<double> Squares => _squares.AsSpan(0, _rows);

    public void Load(ResidualBlock block)
    {
        _rows = block.Rows;
        block.Precise?.CopyGroup(group, k => _qz.AsMemory(k * capacity, _rows));
        for (var k = 0; k < group.Rank && block.Precise is null; k++)
        {
            ComputeColumn(block, k);
        }

        ComputeSums(block);
    }

    private void ComputeColumn(ResidualBlock block, int k)
    {
        var target = Column(k);
        block.Prepared.Column(group.Kept[k]).CopyTo(target);
        var explained = group.Final.Explained(group.Kept[k]);
        for (var j = 0; j < explained.Length; j++)
        {
            BlockKernels.AddScaled(target, -explained[j], block.QColumn(j));
        }

        for (var j = 0; j < k; j++)
        {
            BlockKernels.AddScaled(target, -group.Triangle[j, k], Column(j));
        }

        BlockKernels.Scale(target, 1 / group.Triangle[k, k]);
    }

    private void ComputeSums(ResidualBlock block)
    {
        var fitted = _fitted.AsSpan(0, _rows);
        var squares = _squares.AsSpan(0, _rows);
        fitted.Clear();
        squares.Clear();
        for (var k = 0; k < group.Rank; k++)
        {
            BlockKernels.AddScaled(fitted, group.U[k], Column(k));
            BlockKernels.AddSquares(squares, Column(k));
        }

        for (var i = 0; i < _rows; i++)
        {
            _residuals[i] = block.Residuals[i] - fitted[i];
        }
    }
}
