using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>Fills the sums of one group.</summary>
/// <param name="space">Shared by the groups that one thread works on in turn.</param>
internal sealed class GroupAccumulator(AddedGroup group, GroupSpace space)
{
    /// <summary>A leverage this near to 1 is 1: what is left of 1 - h is rounding.</summary>
    public const double LeverageOne = 1e-10;

    /// <summary>The q x q sums of a group.</summary>
    public const int Sums = 5;

    /// <summary>A squared row of Qz below this is rounding.</summary>
    private const double ZeroRow = 1e-24;

    private readonly GroupSums _sums = new(group.Rank);

    public void Add(ResidualBlock block)
    {
        if (group.Rank == 0)
        {
            return;
        }

        var rows = space.Rows(group.Rank);
        rows.Load(block, group);
        MarkRows(block, rows.Squares);
        space.EachSum(group.Rank, (at, weights, products) =>
        {
            var used = weights.AsSpan(0, block.Rows);
            var into = Weigh(at, block, rows, used);
            BlockKernels.Multiply(used, space.Alive.AsSpan(0, block.Rows), used);
            products.Add(into, rows.Columns, block.Rows, used);
        });
    }

    /// <summary>Takes in the sums over the rows that follow.</summary>
    public void Merge(GroupAccumulator next) => _sums.Merge(next._sums);

    public GroupSums Finish()
    {
        foreach (var sum in new[] { _sums.Hc0, _sums.Hc2, _sums.Hc3, _sums.Score, _sums.Ceiling })
        {
            WeightedProducts.Finish(sum);
        }

        return _sums;
    }

    /// <summary>Fills omega of each row and says which sum it is for.</summary>
    private double[,] Weigh(int at, ResidualBlock block, GroupRows rows, Span<double> omega)
    {
        var complements = space.Complements.AsSpan(0, block.Rows);
        switch (at)
        {
            case 0:
                BlockKernels.Multiply(rows.Residuals, rows.Residuals, omega);
                return _sums.Hc0;
            case 1:
                BlockKernels.Multiply(rows.Residuals, rows.Residuals, omega);
                BlockKernels.Divide(omega, complements, omega);
                return _sums.Hc2;
            case 2:
                BlockKernels.Divide(rows.Residuals, complements, omega);
                BlockKernels.Multiply(omega, omega, omega);
                return _sums.Hc3;
            case 3:
                BlockKernels.Multiply(block.Residuals, block.Residuals, omega);
                return _sums.Score;
            default:
                BlockKernels.Multiply(rows.Fitted, rows.Fitted, omega);
                return _sums.Ceiling;
        }
    }

    /// <summary>
    /// Copies and 1 - h(F + group) of each row, the latter 1 where the row rests on the group alone: HC2 and HC3 are not used then. Rows with h(F) = 1 do not count.
    /// </summary>
    private void MarkRows(ResidualBlock block, ReadOnlySpan<double> squares)
    {
        var leverages = block.Leverages;
        var alive = space.Alive.AsSpan(0, block.Rows);
        if (block.Copies is { } copies)
        {
            copies.AsSpan(0, block.Rows).CopyTo(alive);
        }
        else
        {
            alive.Fill(1);
        }

        if (BlockKernels.Complement(leverages, squares, space.Complements.AsSpan(0, block.Rows)) <= LeverageOne)
        {
            MarkSpecials(block);
        }

        var (trace, contributing) = (_sums.LeverageTrace, _sums.ContributingN);
        for (var i = 0; i < alive.Length; i++)
        {
            trace += alive[i] * leverages[i] * squares[i];
            contributing += squares[i] > ZeroRow ? alive[i] : 0;
        }

        (_sums.LeverageTrace, _sums.ContributingN) = (trace, contributing);
    }

    private void MarkSpecials(ResidualBlock block)
    {
        for (var i = 0; i < block.Rows; i++)
        {
            if (space.Complements[i] <= LeverageOne)
            {
                MarkSpecial(block, i, 1 - block.Leverages[i]);
            }
        }
    }

    private void MarkSpecial(ResidualBlock block, int i, double free)
    {
        space.Complements[i] = 1;
        if (free > LeverageOne)
        {
            _sums.RestsOnRows.Add(block.FirstRow + i);
            return;
        }

        space.Alive[i] = 0;
        _sums.LeverageOneRows.Add(block.FirstRow + i);
    }
}
