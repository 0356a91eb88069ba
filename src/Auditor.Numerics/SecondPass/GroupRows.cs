using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>The rows of a group's orthonormal Qz for a block, with residual and leverage of F + group; for one group of that rank after another.</summary>
internal sealed class GroupRows(int rank, int capacity)
{
    private readonly double[] _residuals = new double[capacity];
    private readonly double[] _fitted = new double[capacity];
    private readonly double[] _squares = new double[capacity];
    private int _rows;

    public PanelColumns Columns { get; } = new(capacity, rank);

    public Span<double> Column(int k) => Columns.Column(k);

    /// <summary>e(F + group) = e(F) - Qz u.</summary>
    public ReadOnlySpan<double> Residuals => _residuals.AsSpan(0, _rows);

    /// <summary>The group's own fitted part Qz u.</summary>
    public ReadOnlySpan<double> Fitted => _fitted.AsSpan(0, _rows);

    /// <summary>|qz|² of each row: h(F + group) - h(F).</summary>
    public ReadOnlySpan<double> Squares => _squares.AsSpan(0, _rows);

    public void Load(ResidualBlock block, AddedGroup group)
    {
        _rows = block.Rows;
        Columns.Begin(_rows);
        if (block.Precise is { } precise)
        {
            precise.CopyGroup(group, Columns.Memory);
        }
        else
        {
            ComputeColumns(block, group);
        }

        ComputeSums(block, group);
    }

    private void ComputeColumns(ResidualBlock block, AddedGroup group)
    {
        for (var k = 0; k < rank; k++)
        {
            block.Prepared.Column(group.Kept[k]).CopyTo(Column(k));
        }

        Columns.Subtract(block.Q, k => group.Final.ExplainedMemory(group.Kept[k]));
        Columns.Solve(group.Triangle);
    }

    private void ComputeSums(ResidualBlock block, AddedGroup group)
    {
        var fitted = _fitted.AsSpan(0, _rows);
        var squares = _squares.AsSpan(0, _rows);
        fitted.Clear();
        squares.Clear();
        for (var k = 0; k < rank; k++)
        {
            BlockKernels.AddScaled(fitted, group.U[k], Column(k));
            BlockKernels.AddSquares(squares, Column(k));
        }

        BlockKernels.Subtract(block.Residuals, fitted, _residuals.AsSpan(0, _rows));
    }
}
