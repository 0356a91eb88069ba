using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>Something that is summed over the rows once the factor is known. Fed with every block, in order.</summary>
public interface IAccumulator
{
    void Add(ResidualBlock block);
}

/// <summary>An accumulator whose sums over parts of the rows can be added up.</summary>
public interface IMergeable : IAccumulator
{
    /// <summary>One like it for other rows, which may be fed by another thread.</summary>
    IMergeable Fork();

    /// <summary>Takes in what was summed over the rows that follow.</summary>
    void Merge(IMergeable next);
}

/// <summary>A block of rows with what the final model says of them; rows times sqrt(w), each of one copy.</summary>
public sealed class ResidualBlock
{
    private readonly double[] _residuals;
    private readonly double[] _leverages;

    internal ResidualBlock(FinalFactor final, int capacity)
    {
        Final = final;
        Precise = final.Factor.IsExtended ? new PreciseRows(final) : null;
        Prepared = new PreparedBlock(capacity, final.Factor.Layout.Columns);
        _residuals = new double[capacity];
        _leverages = new double[capacity];
        Q = new PanelColumns(capacity, final.Rank);
    }

    public int Rows => Prepared.Rows;

    /// <summary>Most rows that one holds.</summary>
    internal int Capacity => _residuals.Length;

    /// <summary>0-based position of the first row within the row set.</summary>
    public int FirstRow { get; private set; }

    /// <summary>e(F) times sqrt(w).</summary>
    public ReadOnlySpan<double> Residuals => _residuals.AsSpan(0, Rows);

    /// <summary>h(F).</summary>
    public ReadOnlySpan<double> Leverages => _leverages.AsSpan(0, Rows);

    /// <summary>How many equal rows each row stands for, null when all are one.</summary>
    public double[]? Copies { get; private set; }

    internal FinalFactor Final { get; }

    internal PreparedBlock Prepared { get; }

    /// <summary>The same rows in extended precision, when the factor is.</summary>
    internal PreciseRows? Precise { get; }

    /// <summary>Column k of the rows of Q_F, 0 to r - 1.</summary>
    internal Span<double> QColumn(int k) => Q.Column(k);

    /// <summary>The rows of Q_F.</summary>
    internal PanelColumns Q { get; }

    /// <param name="residuals">y - X b, not weighted.</param>
    internal void Load(RowBlock block, ReadOnlySpan<double> residuals)
    {
        Prepared.Load(block, (double[])Final.Factor.Shifts, withCopies: false);
        FirstRow = block.FirstRow;
        Copies = block.Copies;
        BlockKernels.Multiply(residuals, Prepared.Scale, _residuals.AsSpan(0, Rows));
        Precise?.Load(block, Prepared.Scale);
        ComputeQ();
    }

    private void ComputeQ()
    {
        Q.Begin(Rows);
        for (var k = 0; k < Final.Rank; k++)
        {
            if (Precise is null)
            {
                Prepared.Column(Final.Kept[k]).CopyTo(QColumn(k));
            }
            else
            {
                Precise.CopyQ(k, QColumn(k));
            }
        }

        if (Precise is null)
        {
            Q.Solve(Final.Triangle);
        }

        AddLeverages();
    }

    private void AddLeverages()
    {
        var leverages = _leverages.AsSpan(0, Rows);
        leverages.Clear();
        for (var k = 0; k < Final.Rank; k++)
        {
            BlockKernels.AddSquares(leverages, QColumn(k));
        }
    }
}
