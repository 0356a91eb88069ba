namespace Auditor.Numerics.Factor;

/// <summary>
/// A block as it enters the arithmetic: the first row's value subtracted from each column when there is an intercept (the column space
/// stays, the cancellation goes), each row times sqrt(w).
/// </summary>
internal sealed class PreparedBlock
{
    private readonly double[] _values;
    private readonly double[] _scale;

    public PreparedBlock(int capacity, int columns)
    {
        Stride = capacity;
        _values = new double[capacity * columns];
        _scale = new double[capacity];
    }

    public int Stride { get; }

    public int Rows { get; private set; }

    public Span<double> Column(int column) => _values.AsSpan(column * Stride, Rows);

    /// <summary>sqrt(w) of each row in use.</summary>
    public ReadOnlySpan<double> Scale => _scale.AsSpan(0, Rows);

    /// <param name="withCopies">Whether a row that stands for several enters times the square root of their number.</param>
    public void Load(RowBlock block, ReadOnlySpan<double> shifts, bool withCopies)
    {
        Rows = block.Rows;
        var scaled = FillScale(block, withCopies);
        for (var c = 0; c < shifts.Length; c++)
        {
            var target = Column(c);
            var source = block.Column(c);
            for (var i = 0; i < target.Length; i++)
            {
                target[i] = source[i] - shifts[c];
            }

            if (scaled)
            {
                BlockKernels.Multiply(target, Scale, target);
            }
        }
    }

    private bool FillScale(RowBlock block, bool withCopies)
    {
        var copies = withCopies ? block.Copies : null;
        for (var i = 0; i < Rows; i++)
        {
            _scale[i] = Math.Sqrt((block.Weights?[i] ?? 1) * (copies?[i] ?? 1));
        }

        return block.Weights is not null || copies is not null;
    }
}
