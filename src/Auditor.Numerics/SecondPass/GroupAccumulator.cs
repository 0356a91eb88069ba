using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>Fills the sums of one group.</summary>
internal sealed class GroupAccumulator : IAccumulator
{
    /// <summary>A leverage this near to 1 is 1: what is left of 1 - h is rounding.</summary>
    public const double LeverageOne = 1e-10;

    /// <summary>A squared row of Qz below this is rounding.</summary>
    private const double ZeroRow = 1e-24;

    /// <summary>Sums of smaller groups are not worth a thread.</summary>
    private const int LargeRank = 64;

    private readonly AddedGroup _group;
    private readonly ParallelOptions _threads;
    private readonly GroupRows _rows;
    private readonly (WeightedProducts Products, Func<ResidualBlock, int, double> Omega, double[] Weights)[] _sums;
    private readonly double[] _alive;

    /// <param name="threads">Most threads for the sums of a large group, each of which is computed by itself.</param>
    public GroupAccumulator(AddedGroup group, int capacity, int threads)
    {
        _group = group;
        _threads = new ParallelOptions { MaxDegreeOfParallelism = group.Rank < LargeRank ? 1 : threads };
        _rows = new GroupRows(group, capacity);
        _alive = new double[capacity];
        Sums = new GroupSums(group.Rank);
        _sums =
        [
            Sum(Sums.Hc0, (_, i) => Square(_rows.Residuals[i])),
            Sum(Sums.Hc2, (block, i) => Square(_rows.Residuals[i]) / Complement(block, i)),
            Sum(Sums.Hc3, (block, i) => Square(_rows.Residuals[i] / Complement(block, i))),
            Sum(Sums.Score, (block, i) => Square(block.Residuals[i])),
            Sum(Sums.Ceiling, (_, i) => Square(_rows.Fitted[i])),
        ];

        (WeightedProducts Products, Func<ResidualBlock, int, double> Omega, double[] Weights) Sum(double[,] into, Func<ResidualBlock, int, double> omega) =>
            (new WeightedProducts(into, capacity), omega, new double[capacity]);
    }

    public GroupSums Sums { get; }

    public void Add(ResidualBlock block)
    {
        if (_group.Rank == 0)
        {
            return;
        }

        _rows.Load(block);
        MarkRows(block);
        if (_threads.MaxDegreeOfParallelism > 1)
        {
            Parallel.For(0, _sums.Length, _threads, at => AddProducts(block, at));
            return;
        }

        for (var at = 0; at < _sums.Length; at++)
        {
            AddProducts(block, at);
        }
    }

    public GroupSums Finish()
    {
        foreach (var sum in _sums)
        {
            sum.Products.Finish();
        }

        return Sums;
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

    private void AddProducts(ResidualBlock block, int at)
    {
        var (products, omega, weights) = _sums[at];
        for (var i = 0; i < block.Rows; i++)
        {
            weights[i] = _alive[i] == 0 ? 0 : _alive[i] * omega(block, i);
        }

        products.Add(_rows.Columns, block.Rows, weights.AsSpan(0, block.Rows));
    }
}
