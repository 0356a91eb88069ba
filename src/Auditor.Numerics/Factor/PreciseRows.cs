namespace Auditor.Numerics.Factor;

/// <summary>The rows of Q_F and of a group's Qz for a block, computed in double-double from columns with their low parts: for a factor in extended precision.</summary>
internal sealed class PreciseRows(FinalFactor final)
{
    private readonly DoubleDoubleMatrix _triangle = final.PreciseTriangle!;
    private RowBlock? _block;
    private double[] _scale = [];
    private DoubleDouble[][] _q = [];

    /// <param name="scale">sqrt(w) of each row.</param>
    public void Load(RowBlock block, ReadOnlySpan<double> scale)
    {
        (_block, _scale) = (block, scale.ToArray());
        _q = new DoubleDouble[final.Rank][];
        for (var k = 0; k < final.Rank; k++)
        {
            _q[k] = Solved(Column(final.Kept[k]), _triangle.Column(k)[..(k + 1)], _q);
        }
    }

    /// <summary>Column k of the rows of Q_F.</summary>
    public void CopyQ(int k, Span<double> into) => Round(_q[k], into);

    /// <summary>The columns of the rows of Qz, q of them.</summary>
    public void CopyGroup(AddedGroup group, Func<int, Memory<double>> into)
    {
        var qz = new DoubleDouble[group.Rank][];
        for (var k = 0; k < group.Rank; k++)
        {
            var column = Column(group.Kept[k]);
            Subtract(column, final.PreciseExplained(group.Kept[k]), _q);
            qz[k] = Solved(column, group.PreciseTriangle!.Column(k)[..(k + 1)], qz);
            Round(qz[k], into(k).Span);
        }
    }

    /// <summary>(column - earlier t_1..k) / t_kk.</summary>
    private static DoubleDouble[] Solved(DoubleDouble[] column, ReadOnlySpan<DoubleDouble> t, DoubleDouble[][] earlier)
    {
        Subtract(column, t[..^1], earlier);
        var inverse = DoubleDouble.Of(1) / t[^1];
        return [.. column.Select(value => value * inverse)];
    }

    private static void Subtract(DoubleDouble[] column, ReadOnlySpan<DoubleDouble> factors, DoubleDouble[][] columns)
    {
        for (var j = 0; j < factors.Length; j++)
        {
            for (var i = 0; i < column.Length; i++)
            {
                column[i] -= columns[j][i] * factors[j];
            }
        }
    }

    private static void Round(DoubleDouble[] column, Span<double> into)
    {
        for (var i = 0; i < column.Length; i++)
        {
            into[i] = column[i].Value;
        }
    }

    private DoubleDouble[] Column(int column)
    {
        var shift = DoubleDouble.Of(final.Factor.Shifts[column]);
        var values = new DoubleDouble[_block!.Rows];
        for (var i = 0; i < values.Length; i++)
        {
            var low = _block.Low is null ? 0 : _block.LowColumn(column)[i];
            values[i] = (new DoubleDouble(_block.Column(column)[i], low) - shift) * _scale[i];
        }

        return values;
    }
}
