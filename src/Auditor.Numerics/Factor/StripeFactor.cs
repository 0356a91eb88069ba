namespace Auditor.Numerics.Factor;

/// <summary>The factor of one stripe of rows and its totals; stripes are merged in order.</summary>
/// <param name="shifts">What to subtract from each column, the same for all stripes.</param>
internal sealed class StripeFactor(DesignLayout layout, double[] shifts)
{
    /// <summary>An entry of R below this share of its column's length is rounding.</summary>
    private const double Rounding = 1e-14;

    private readonly StackedPanels _panels = new(new ColumnMatrix(layout.Columns, layout.Columns));
    private readonly double[] _largest = new double[layout.Columns];
    private PreparedBlock? _prepared;
    private int _rows;
    private double _n;
    private double _sumOfWeights;
    private double _sumOfLogWeights;

    public StripeFactor AddAll(IEnumerable<RowBlock> blocks)
    {
        foreach (var block in blocks.Where(block => block.Rows > 0))
        {
            Add(block);
        }

        _prepared = null;
        return this;
    }

    /// <summary>Takes in the factor of the rows that follow; it is used up.</summary>
    public void Merge(StripeFactor next)
    {
        var size = layout.Columns;
        var stride = StackedPanels.WholeSteps(size) + PanelKernels.Width;
        var block = new double[stride * size];
        for (var c = 0; c < size; c++)
        {
            next._panels.Triangle.Column(c).CopyTo(block.AsSpan(c * stride));
            _largest[c] = Math.Max(_largest[c], next._largest[c]);
        }

        _panels.Stack(block, stride, size, triangular: true);
        _rows += next._rows;
        _n += next._n;
        _sumOfWeights += next._sumOfWeights;
        _sumOfLogWeights += next._sumOfLogWeights;
    }

    public OrthogonalFactor Finish() => _rows == 0
        ? throw new ArgumentException("a design without rows has no factor")
        : new OrthogonalFactor(layout, Trimmed(), shifts, _largest, new RowTotals(_rows, _n, _sumOfWeights, _sumOfLogWeights));

    /// <summary>
    /// With fewer rows than columns the last rows of R hold nothing but rounding, far below what decides whether a column is aliased
    /// (<see cref="RankTolerance"/>): without them every submodel is a problem of as many rows as the data have.
    /// </summary>
    private ColumnMatrix Trimmed()
    {
        var (r, size) = (_panels.Triangle, layout.Columns);
        var negligible = Enumerable.Range(0, size).Select(c => Rounding * Math.Sqrt(BlockKernels.Dot(r.Column(c), r.Column(c)))).ToArray();
        var rows = size;
        while (rows > _rows && Enumerable.Range(0, size).All(c => Math.Abs(r[rows - 1, c]) <= negligible[c]))
        {
            rows--;
        }

        return rows == size ? r : r.Select([.. Enumerable.Range(0, size)], 0, rows);
    }

    private void Add(RowBlock block)
    {
        _prepared ??= PreparedBlock.ForPanels(block.Stride, layout.Columns);
        _prepared.Load(block, shifts, withCopies: true);
        _prepared.ClearTail(layout.Columns);
        Count(block);
        _panels.Stack(_prepared.Values, _prepared.Stride, block.Rows, triangular: false);
    }

    private void Count(RowBlock block)
    {
        _rows += block.Rows;
        CountWeights(block);
        for (var c = 0; c < layout.Columns; c++)
        {
            _largest[c] = Math.Max(_largest[c], BlockKernels.LargestAbsolute(block.Column(c)));
        }
    }

    private void CountWeights(RowBlock block)
    {
        if (block.Weights is null && block.Copies is null)
        {
            _n += block.Rows;
            _sumOfWeights += block.Rows;
            return;
        }

        for (var i = 0; i < block.Rows; i++)
        {
            var (weight, copies) = (block.Weights?[i] ?? 1, block.Copies?[i] ?? 1);
            _n += copies;
            _sumOfWeights += weight * copies;
            _sumOfLogWeights += copies * Math.Log(weight);
        }
    }
}
