namespace Auditor.Numerics.Factor;

/// <summary>Builds the factor of a design in one pass over its rows.</summary>
public static class FactorBuilder
{
    /// <exception cref="ArgumentException">The design has no rows.</exception>
    public static OrthogonalFactor Build(IDesignRows design)
    {
        var state = new State(design.Layout);
        foreach (var block in design.Blocks())
        {
            state.Add(block);
        }

        return state.Finish();
    }

    private sealed class State(DesignLayout layout)
    {
        private readonly ColumnMatrix _r = new(layout.Columns, layout.Columns);
        private readonly double[] _shifts = new double[layout.Columns];
        private readonly double[] _largest = new double[layout.Columns];
        private PreparedBlock? _prepared;
        private int _rows;
        private double _n;
        private double _sumOfWeights;
        private double _sumOfLogWeights;

        public void Add(RowBlock block)
        {
            if (block.Rows == 0)
            {
                return;
            }

            if (_rows == 0)
            {
                TakeShifts(block);
            }

            _prepared ??= new PreparedBlock(block.Stride, layout.Columns);
            _prepared.Load(block, _shifts, withCopies: true);
            Count(block);
            Householder.Stack(_r, _prepared);
        }

        public OrthogonalFactor Finish() => _rows == 0
            ? throw new ArgumentException("a design without rows has no factor")
            : new OrthogonalFactor(layout, _r, _shifts, _largest, new RowTotals(_rows, _n, _sumOfWeights, _sumOfLogWeights));

        private void TakeShifts(RowBlock block)
        {
            for (var c = 1; layout.Intercept && c < layout.Columns; c++)
            {
                _shifts[c] = block.Column(c)[0];
            }
        }

        private void Count(RowBlock block)
        {
            _rows += block.Rows;
            for (var i = 0; i < block.Rows; i++)
            {
                var (weight, copies) = (block.Weights?[i] ?? 1, block.Copies?[i] ?? 1);
                _n += copies;
                _sumOfWeights += weight * copies;
                _sumOfLogWeights += copies * Math.Log(weight);
            }

            for (var c = 0; c < layout.Columns; c++)
            {
                foreach (var value in block.Column(c))
                {
                    _largest[c] = Math.Max(_largest[c], Math.Abs(value));
                }
            }
        }
    }
}
