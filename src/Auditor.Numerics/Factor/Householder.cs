namespace Auditor.Numerics.Factor;

/// <summary>Householder reflections of small matrices, column by column.</summary>
internal static class Householder
{
    /// <summary>
    /// Reflects rows <paramref name="from"/> and below so that the column becomes zero below its row <paramref name="from"/>; the same
    /// reflection is applied to the given later columns. Trailing zeros of the column are left out, so that a nearly triangular
    /// matrix stays cheap.
    /// </summary>
    public static void Reflect(ColumnMatrix matrix, int column, int from, ReadOnlySpan<int> later)
    {
        var last = LastNonZero(matrix.Column(column));
        if (last <= from)
        {
            return;
        }

        var rows = last - from + 1;
        var v = matrix.Column(column).Slice(from, rows).ToArray();
        var length = Math.Sqrt(BlockKernels.Dot(v, v));
        var image = v[0] > 0 ? -length : length;
        v[0] -= image;
        var factor = 1 / (image * v[0]); // v'v = -2 image v_0
        var own = matrix.Column(column).Slice(from, rows);
        own.Clear();
        own[0] = image;
        foreach (var c in later)
        {
            var other = matrix.Column(c).Slice(from, rows);
            BlockKernels.AddScaled(other, factor * BlockKernels.Dot(v, other), v);
        }
    }

    private static int LastNonZero(ReadOnlySpan<double> column)
    {
        var last = column.Length - 1;
        while (last > 0 && column[last] == 0)
        {
            last--;
        }

        return last;
    }
}
