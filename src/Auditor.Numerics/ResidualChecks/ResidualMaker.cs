using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Turns a vector of n errors into the residuals that the final model leaves of them: e = (I - QQ') u, Q an orthonormal basis (n x r) of the columns times sqrt(w).
/// Holds Q, so it is for small n.
/// </summary>
internal sealed class ResidualMaker
{
    private readonly ColumnMatrix _q;

    private ResidualMaker(ColumnMatrix q)
    {
        _q = q;
        Orthonormalise();
    }

    public int N => _q.Rows;

    /// <summary>Rows of Q in the given order.</summary>
    public ColumnMatrix Arranged(IReadOnlyList<int> rows)
    {
        var arranged = new ColumnMatrix(rows.Count, _q.Columns);
        for (var k = 0; k < _q.Columns; k++)
        {
            for (var i = 0; i < rows.Count; i++)
            {
                arranged[i, k] = _q[rows[i], k];
            }
        }

        return arranged;
    }

    /// <param name="design">A row that stands for several gives as many.</param>
    public static ResidualMaker Of(IDesignRows design)
    {
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        var q = new ColumnMatrix((int)final.Factor.Totals.N, final.Rank);
        var (next, residuals) = (0, (ResidualBlock?)null);
        foreach (var block in design.Blocks())
        {
            residuals ??= new ResidualBlock(final, block.Stride);
            residuals.Load(block, new double[block.Rows]);
            next = Copy(residuals, q, next);
        }

        return new ResidualMaker(q);
    }

    /// <summary>Replaces errors by residuals.</summary>
    public void Take(Span<double> errors)
    {
        for (var k = 0; k < _q.Columns; k++)
        {
            BlockKernels.AddScaled(errors, -BlockKernels.Dot(_q.Column(k), errors), _q.Column(k));
        }
    }

    private static int Copy(ResidualBlock block, ColumnMatrix q, int next)
    {
        for (var i = 0; i < block.Rows; i++)
        {
            for (var copy = 0; copy < (block.Copies?[i] ?? 1); copy++, next++)
            {
                for (var k = 0; k < q.Columns; k++)
                {
                    q[next, k] = block.QColumn(k)[i];
                }
            }
        }

        return next;
    }

    /// <summary>Rows by R^-1 lose orthogonality as columns are ill-conditioned; one pass of modified Gram–Schmidt restores it.</summary>
    private void Orthonormalise()
    {
        for (var k = 0; k < _q.Columns; k++)
        {
            var column = _q.Column(k);
            for (var j = 0; j < k; j++)
            {
                BlockKernels.AddScaled(column, -BlockKernels.Dot(_q.Column(j), column), _q.Column(j));
            }

            BlockKernels.Scale(column, 1 / Math.Sqrt(BlockKernels.Dot(column, column)));
        }
    }
}
