using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;
using Auditor.Numerics.Storage;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Keeps residual and leverage of every row: what the checks need beside the design. Two numbers a row, never the design.</summary>
public sealed class ResidualStore : IMergeable
{
    private const int BlockRows = 1 << 12;

    private readonly WritableCells<double> _residuals;
    private readonly WritableCells<double> _leverages;
    private readonly CellStore _where;
    private readonly Lazy<(double Least, double Greatest)> _range;
    private readonly Lock _making = new();
    private WritableCells<double>? _copies;

    /// <param name="rows">Rows of the row set.</param>
    /// <param name="where">Where they are kept.</param>
    public ResidualStore(int rows, CellStore? where = null)
    {
        _where = where ?? CellStore.Memory;
        (_residuals, _leverages) = (Cells(rows), Cells(rows));
        _range = new(FindRange);
    }

    public int Count => _residuals.Count;

    /// <summary>sqrt(w) e, one a row of the row set.</summary>
    public Cells<double> Residuals => _residuals;

    /// <summary>h, one a row.</summary>
    public Cells<double> Leverages => _leverages;

    /// <summary>How many equal rows each row stands for; null without frequency weights: one.</summary>
    public Cells<double>? Copies => _copies;

    /// <summary>Greatest less least residual.</summary>
    public double Spread => Count > 0 ? _range.Value.Greatest - _range.Value.Least : 0;

    /// <summary>How many equal rows a row stands for.</summary>
    public double CopiesOf(int row) => _copies?[row] ?? 1;

    public void Add(ResidualBlock block)
    {
        _residuals.Write(block.FirstRow, block.Residuals);
        _leverages.Write(block.FirstRow, block.Leverages);
        if (block.Copies is { } copies)
        {
            MakeCopies().Write(block.FirstRow, copies.AsSpan(0, block.Rows));
        }
    }

    /// <summary>Itself: every row has a place of its own.</summary>
    public IMergeable Fork() => this;

    public void Merge(IMergeable next)
    {
    }

    /// <summary>Every observation's residual: a row that stands for several gives as many.</summary>
    public double[] Expanded()
    {
        if (_copies is null)
        {
            var all = GC.AllocateUninitializedArray<double>(Count);
            _residuals.Read(0, all);
            return all;
        }

        var expanded = new List<double>(Count);
        for (var i = 0; i < Count; i++)
        {
            for (var copy = 0; copy < _copies[i]; copy++)
            {
                expanded.Add(_residuals[i]);
            }
        }

        return [.. expanded];
    }

    private WritableCells<double> Cells(int rows)
    {
        var cells = _where.Create<double>();
        cells.Resize(rows);
        return cells;
    }

    private WritableCells<double> MakeCopies()
    {
        lock (_making)
        {
            return _copies ??= Cells(Count);
        }
    }

    private (double Least, double Greatest) FindRange()
    {
        var (least, greatest) = (double.PositiveInfinity, double.NegativeInfinity);
        var block = new double[Math.Min(BlockRows, Count)];
        for (var first = 0; first < Count; first += BlockRows)
        {
            var values = block.AsSpan(0, Math.Min(BlockRows, Count - first));
            _residuals.Read(first, values);
            (least, greatest) = BlockKernels.Range(values, least, greatest);
        }

        return (least, greatest);
    }
}
