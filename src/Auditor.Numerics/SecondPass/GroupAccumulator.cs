using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>Fills the sums of one group.</summary>
internal sealed class GroupAccumulator(AddedGroup group, int capacity) : IAccumulator
{
    /// <summary>A leverage this near to 1 is 1: what is left of 1 - h is rounding.</summary>
    public const double LeverageOne = 1e-10;

    /// <summary>A squared row of Qz below this is rounding.</summary>
    private const double ZeroRow = 1e-24;

    private readonly GroupRows _rows = new(group, capacity);
    private readonly double[] _weight = new double[capacity];
    private readonly double[] _scaled = new double[capacity];
    private readonly double[] _alive = new double[capacity];

    public GroupSums Sums { get; } = new(group.Rank);

    public void Add(ResidualBlock block)
    {
        if (group.Rank == 0)
        {
            return;
        }

        _rows.Load(block);
        MarkRows(block);
        AddProducts(Sums.Hc0, block.Rows, i => Square(_rows.Residuals[i]));
        AddProducts(Sums.Hc2, block.Rows, i => Square(_rows.Residuals[i]) / Complement(block, i));
        AddProducts(Sums.Hc3, block.Rows, i => Square(_rows.Residuals[i] / Complement(block, i)));
        AddProducts(Sums.Score, block.Rows, i => Square(block.Residuals[i]));
        AddProducts(Sums.Ceiling, block.Rows, i => Square(_rows.Fitted[i]));
    }

    private static double Square(double value) => value * value;

    /// <summary>1 - h(F + group), 1 where the row rests on the group alone: those estimators are not used then.</summary>
    private double Complement(ResidualBlock block, int i)
    {
        var complement = 1 - block.Leverages[i] - _rows.Squares[i];
        return complement <= LeverageOne ? 1 : complement;
    }

    private void MarkRows(ResidualBlock block)
    {
        for (var i = 0; i < block.Rows; i++)
        {
            var copies = block.Copies?[i] ?? 1;
            _alive[i] = copies;
            if (1 - block.Leverages[i] <= LeverageOne)
            {
                _alive[i] = 0;
                Sums.LeverageOneRows.Add(block.FirstRow + i);
                continue;
            }

            if (1 - block.Leverages[i] - _rows.Squares[i] <= LeverageOne)
            {
                Sums.RestsOnRows.Add(block.FirstRow + i);
            }

            Sums.LeverageTrace += copies * block.Leverages[i] * _rows.Squares[i];
            Sums.ContributingN += _rows.Squares[i] > ZeroRow ? copies : 0;
        }
    }

    private void AddProducts(double[,] into, int rows, Func<int, double> omega)
    {
        for (var i = 0; i < rows; i++)
        {
            _weight[i] = _alive[i] == 0 ? 0 : _alive[i] * omega(i);
        }

        var scaled = _scaled.AsSpan(0, rows);
        for (var a = 0; a < group.Rank; a++)
        {
            BlockKernels.Multiply(_rows.Column(a), _weight.AsSpan(0, rows), scaled);
            for (var b = 0; b <= a; b++)
            {
                into[a, b] += BlockKernels.Dot(scaled, _rows.Column(b));
                into[b, a] = into[a, b];
            }
        }
    }
}
