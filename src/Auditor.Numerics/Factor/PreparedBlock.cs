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
        : this(capacity, columns, capacity)
    {
    }

    private PreparedBlock(int capacity, int columns, int stride)
    {
        Stride = stride;
        _values = new double[stride * columns];
        _scale = new double[capacity];
    }

    public int Stride { get; }

    /// <summary>Column c, row i at <c>Values[c * Stride + i]</c>.</summary>
    public double[] Values => _values;

    public int Rows { get; private set; }

    public Span<double> Column(int column) => _values.AsSpan(column * Stride, Rows);

    /// <summary>sqrt(w) of each row in use.</summary>
    public Span<double> Scale => _scale.AsSpan(0, Rows);

    /// <summary>
    /// For <see cref="StackedPanels"/>: each column ends in zeros to a whole number of its row steps. The stride is an odd number of the
    /// processor's cache lines, so that neighbouring columns do not compete for the same place in the cache.
    /// </summary>
    public static PreparedBlock ForPanels(int capacity, int columns) =>
        new(capacity, columns, StackedPanels.WholeSteps(capacity) + PanelKernels.Width);

    /// <summary>Puts zeros after the last row in use, up to a whole number of row steps.</summary>
    public void ClearTail(int columns)
    {
        for (var c = 0; c < columns && Rows % PanelKernels.RowStep != 0; c++)
        {
            _values.AsSpan((c * Stride) + Rows, StackedPanels.WholeSteps(Rows) - Rows).Clear();
        }
    }

    /// <param name="withCopies">Whether a row that stands for several enters times the square root of their number.</param>
    public void Load(RowBlock block, ReadOnlySpan<double> shifts, bool withCopies)
    {
        Rows = block.Rows;
        var scaled = FillScale(block, withCopies);
        for (var c = 0; c < shifts.Length; c++)
        {
            var target = Column(c);
            BlockKernels.Shift(block.Column(c), shifts[c], target);
            if (scaled)
            {
                BlockKernels.Multiply(target, Scale, target);
            }
        }
    }

    private bool FillScale(RowBlock block, bool withCopies)
    {
        var copies = withCopies ? block.Copies : null;
        if (block.Weights is null && copies is null)
        {
            Scale.Fill(1);
            return false;
        }

        for (var i = 0; i < Rows; i++)
        {
            _scale[i] = Math.Sqrt((block.Weights?[i] ?? 1) * (copies?[i] ?? 1));
        }

        return true;
    }
}
