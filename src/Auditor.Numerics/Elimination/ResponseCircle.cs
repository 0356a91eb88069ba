using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Elimination;

/// <summary>
/// The responses that agree with the observed one in everything but how much of what F leaves over the group explains:
/// y(theta) = P_F y + rho (cos theta u_r + sin theta u_z), rho² = RSS(F), u_z the unit projection of M_F y on Z~, u_r the unit residual of F + group.
/// theta runs from 0 to pi/2; tan² theta df2/df1 is the partial F.
/// </summary>
internal sealed class ResponseCircle
{
    private ResponseCircle(ColumnMatrix parts, double tangent) => (Parts, Tangent) = (parts, tangent);

    /// <summary>P x 3: P_F y, rho u_r and rho u_z in the coordinates of R.</summary>
    public ColumnMatrix Parts { get; }

    /// <summary>tan theta of the observed response.</summary>
    public double Tangent { get; }

    /// <summary>The coordinates of y(theta) on the three parts.</summary>
    public static void At(double tangent, Span<double> t)
    {
        var secant = double.Hypot(1, tangent);
        (t[0], t[1], t[2]) = (1, 1 / secant, tangent / secant);
    }

    /// <summary>The group must add rank, and neither fit be perfect.</summary>
    public static ResponseCircle Of(AddedGroup group)
    {
        var factor = group.Final.Factor;
        var (size, candidates) = (factor.R.Rows, factor.Layout.FinalColumns + group.Columns.Count);
        int[] columns = [.. Enumerable.Range(0, factor.Layout.FinalColumns), .. group.Columns];
        var matrix = new ColumnMatrix(size, candidates + 1 + size);
        for (var c = 0; c < candidates; c++)
        {
            factor.R.Column(columns[c]).CopyTo(matrix.Column(c));
        }

        factor.R.Column(factor.Layout.Response).CopyTo(matrix.Column(candidates));
        for (var k = 0; k < size; k++)
        {
            matrix[k, candidates + 1 + k] = 1;
        }

        // The identity, carried along, becomes Q': row k holds the k-th direction in the coordinates of R.
        var reduction = Reduction.Of(factor, matrix, null, candidates, 0, position => columns[position]);
        var (rank, with) = (reduction.Kept.Count(position => position < factor.Layout.FinalColumns), reduction.Kept.Count);
        var y = reduction.Rotated.Column(candidates).ToArray();
        var (explained, residual) = (Length(y[rank..with]), Length(y[with..]));
        var rho = double.Hypot(explained, residual);
        var parts = new ColumnMatrix(size, 3);
        Combine(reduction.Rotated, candidates + 1, y, 0, rank, 1, parts.Column(0));
        Combine(reduction.Rotated, candidates + 1, y, with, size, rho / residual, parts.Column(1));
        Combine(reduction.Rotated, candidates + 1, y, rank, with, rho / explained, parts.Column(2));
        return new ResponseCircle(parts, explained / residual);
    }

    private static double Length(double[] values) => Math.Sqrt(BlockKernels.Dot(values, values));

    private static void Combine(ColumnMatrix rotated, int identity, double[] y, int from, int to, double scale, Span<double> into)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] = scale * BlockKernels.Dot(rotated.Column(identity + i)[from..to], y.AsSpan(from, to - from));
        }
    }
}
