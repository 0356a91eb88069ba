namespace Auditor.Numerics.Factor;

/// <summary>Householder reflections, one at a time: of small matrices, and of a short block stacked under a triangle.</summary>
internal static class Householder
{
    /// <summary>
    /// A squared length below this is nothing: when columns outnumber rows, rounding is reflected again and again and shrinks each time, until its squares
    /// would underflow. A column as small as that counts as zero.
    /// </summary>
    public const double Nothing = 1e-200;

    /// <summary>
    /// Factors the block stacked under the triangle into the triangle. The block, column-major, is used up. The reflection of column j touches row j of the
    /// triangle and all rows of the block.
    /// </summary>
    public static void Stack(ColumnMatrix triangle, double[] block, int stride, int rows)
    {
        for (var j = 0; j < triangle.Columns; j++)
        {
            var below = block.AsSpan(j * stride, rows);
            var squared = BlockKernels.Dot(below, below);
            if (squared < Nothing)
            {
                continue;
            }

            var diagonal = triangle[j, j];
            var length = Math.Sqrt(Math.FusedMultiplyAdd(diagonal, diagonal, squared));
            var image = diagonal > 0 ? -length : length;
            triangle[j, j] = image;
            var (top, factor) = (diagonal - image, 1 / (image * (diagonal - image))); // v'v = -2 image top
            for (var k = j + 1; k < triangle.Columns; k++)
            {
                var other = block.AsSpan(k * stride, rows);
                var scale = factor * Math.FusedMultiplyAdd(top, triangle[j, k], BlockKernels.Dot(below, other));
                triangle[j, k] = Math.FusedMultiplyAdd(scale, top, triangle[j, k]);
                BlockKernels.AddScaled(other, scale, below);
            }
        }
    }

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
