namespace Auditor.Numerics.Factor;

/// <summary>
/// The factor once more in double-double, for small designs whose columns are so nearly combinations of one another that a factor in double would cost
/// digits of standard errors and tests: high powers of one number, for the most part. Columns that the tool forms itself enter with their low parts.
/// </summary>
/// <remarks>Checked against the certified values of NIST StRD's Filip (tests/reference) and against products of exact powers in the tests.</remarks>
internal static class PreciseFactor
{
    /// <summary>A column whose part orthogonal to the earlier ones is a smaller share of its length costs more than four digits (common practice, no source).</summary>
    private const double Costly = 1e-4;

    /// <summary>Squared columns times rows, once more for each group added last; about a second. A larger design is factored in double, and the trustworthy digits say what that costs.</summary>
    private const double LargestWork = 2e7;

    public static bool IsWanted(OrthogonalFactor factor) =>
        Work(factor) <= LargestWork
        && Enumerable.Range(0, factor.R.Columns - 1).Any(column => IsCostly(factor, column));

    /// <param name="plain">The factor of the same rows in double, for the shifts and totals.</param>
    public static OrthogonalFactor Build(IDesignRows extended, OrthogonalFactor plain)
    {
        var columns = plain.R.Columns;
        var matrix = Load(extended, plain, Math.Max(plain.Totals.Rows, columns));
        var later = Enumerable.Range(0, columns).ToArray();
        for (var c = 0; c < columns; c++)
        {
            matrix.Reflect(c, c, later.AsSpan(c + 1));
        }

        var precise = matrix.Select(later, 0, columns);
        var rounded = new ColumnMatrix(columns, columns);
        precise.RoundTo(rounded);
        return new OrthogonalFactor(plain.Layout, rounded, (double[])plain.Shifts, (double[])plain.LargestValues, plain.Totals, precise);
    }

    private static double Work(OrthogonalFactor factor)
    {
        double columns = factor.R.Columns;
        return columns * columns * (Math.Max(factor.Totals.Rows, columns) + (factor.Layout.Groups.Count * columns));
    }

    /// <summary>The column is kept, but costs digits in double.</summary>
    public static bool IsCostly(OrthogonalFactor factor, int column)
    {
        if (column >= factor.R.Rows)
        {
            return false;
        }

        var share = Math.Abs(factor.R[column, column]) / factor.Lengths[column];
        return share is > RankTolerance.Aliased and < Costly;
    }

    private static DoubleDoubleMatrix Load(IDesignRows design, OrthogonalFactor plain, int rows)
    {
        var matrix = new DoubleDoubleMatrix(rows, plain.R.Columns);
        foreach (var block in design.Blocks())
        {
            var scale = Scale(block);
            for (var c = 0; c < matrix.Columns; c++)
            {
                Load(block, c, plain.Shifts[c], scale, matrix.Column(c)[block.FirstRow..]);
            }
        }

        return matrix;
    }

    private static void Load(RowBlock block, int column, double shift, DoubleDouble[]? scale, Span<DoubleDouble> into)
    {
        var values = block.Column(column);
        var low = block.LowColumn(column);
        for (var i = 0; i < values.Length; i++)
        {
            var value = new DoubleDouble(values[i], low.IsEmpty ? 0 : low[i]) - DoubleDouble.Of(shift);
            into[i] = scale is null ? value : value * scale[i];
        }
    }

    private static DoubleDouble[]? Scale(RowBlock block) => block.Weights is null && block.Copies is null
        ? null
        : [.. Enumerable.Range(0, block.Rows).Select(i => DoubleDouble.Sqrt(DoubleDouble.Of(block.Weights?[i] ?? 1) * (block.Copies?[i] ?? 1)))];
}
