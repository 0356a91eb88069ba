using Auditor.Numerics.Factor;
using Auditor.Numerics.Random;
using CsCheck;

namespace Auditor.Numerics.Tests.Factor;

/// <summary>
/// Reflections eight at a time against reflections one by one on the same blocks, and both against the products X'X of the columns: R'R = X'X whatever the rank.
/// </summary>
public sealed class PanelTests
{
    private const double Tolerance = 1e-12;

    /// <summary>Columns that are zero, equal to earlier ones, sums of earlier ones or of other sizes, in any place.</summary>
    private static Gen<double[][]> Design =>
        from rows in Gen.Int[256, 700]
        from columns in Gen.Int[1, 45]
        from kinds in Gen.Int[0, 7].Array[columns]
        from seed in Gen.Int
        select Columns(rows, kinds, seed);

    [Fact]
    public void Panels_and_single_reflections_have_the_products_of_the_columns() =>
        Design.Sample(columns => Same(columns), iter: 60);

    [Theory]
    [InlineData(256, 300)]
    [InlineData(300, 420)]
    public void More_columns_than_rows(int rows, int columns) => Same(Columns(rows, new int[columns], 5));

    [Fact]
    public void Nothing_but_zeros() => Same([.. Enumerable.Range(0, 20).Select(_ => new double[256])]);

    /// <summary>At full rank the triangles themselves agree, signs and all.</summary>
    [Theory]
    [InlineData(1)]
    [InlineData(7)]
    [InlineData(8)]
    [InlineData(9)]
    [InlineData(16)]
    [InlineData(33)]
    public void Full_rank_gives_the_same_triangle(int columns)
    {
        var design = Columns(523, new int[columns], 11);
        var (panels, single) = (Panels(design, 256).Triangle, Single(design, 256));
        Near(single, panels, c => Length(design[c]));
    }

    /// <summary>A triangle stacked under a triangle, as stripes are merged: only the rows that can differ from zero are touched.</summary>
    [Theory]
    [InlineData(5)]
    [InlineData(24)]
    [InlineData(61)]
    public void Merging_triangles_gives_the_factor_of_all_rows(int columns)
    {
        var design = Columns(800, new int[columns], 3);
        var (first, second) = (Panels([.. design.Select(column => column[..400])], 400), Panels([.. design.Select(column => column[400..])], 400));
        var stride = StackedPanels.WholeSteps(columns) + PanelKernels.Width;
        var block = new double[stride * columns];
        for (var c = 0; c < columns; c++)
        {
            second.Triangle.Column(c).CopyTo(block.AsSpan(c * stride));
        }

        first.Stack(block, stride, columns, triangular: true);
        HasProducts(design, first.Triangle);
    }

    private static void Same(double[][] design)
    {
        HasProducts(design, Panels(design, 256).Triangle);
        HasProducts(design, Single(design, 256));
    }

    private static StackedPanels Panels(double[][] design, int blockRows)
    {
        var panels = new StackedPanels(new ColumnMatrix(design.Length, design.Length));
        foreach (var (block, stride, rows) in Blocks(design, blockRows))
        {
            panels.Stack(block, stride, rows, triangular: false);
        }

        return panels;
    }

    private static ColumnMatrix Single(double[][] design, int blockRows)
    {
        var triangle = new ColumnMatrix(design.Length, design.Length);
        foreach (var (block, stride, rows) in Blocks(design, blockRows))
        {
            Householder.Stack(triangle, block, stride, rows);
        }

        return triangle;
    }

    private static IEnumerable<(double[] Block, int Stride, int Rows)> Blocks(double[][] design, int blockRows)
    {
        var stride = StackedPanels.WholeSteps(blockRows) + PanelKernels.Width;
        for (var first = 0; first < design[0].Length; first += blockRows)
        {
            var rows = Math.Min(blockRows, design[0].Length - first);
            var block = new double[stride * design.Length];
            for (var c = 0; c < design.Length; c++)
            {
                design[c].AsSpan(first, rows).CopyTo(block.AsSpan(c * stride));
            }

            yield return (block, stride, rows);
        }
    }

    private static void HasProducts(double[][] design, ColumnMatrix r)
    {
        for (var a = 0; a < design.Length; a++)
        {
            for (var b = 0; b <= a; b++)
            {
                var (expected, actual) = (Product(design[a], design[b]), Product(r.Column(a), r.Column(b)));
                Assert.True(Math.Abs(expected - actual) <= Tolerance * Length(design[a]) * Length(design[b]), $"columns {a}, {b}: {expected:R}, {actual:R}");
            }
        }
    }

    private static void Near(ColumnMatrix expected, ColumnMatrix actual, Func<int, double> length)
    {
        for (var c = 0; c < expected.Columns; c++)
        {
            for (var row = 0; row < expected.Rows; row++)
            {
                Assert.True(Math.Abs(expected[row, c] - actual[row, c]) <= Tolerance * length(c));
            }
        }
    }

    private static double Product(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        var sum = 0.0;
        for (var i = 0; i < a.Length; i++)
        {
            sum += a[i] * b[i];
        }

        return sum;
    }

    private static double Length(double[] column) => Math.Sqrt(Product(column, column));

    private static double[][] Columns(int rows, int[] kinds, int seed)
    {
        var random = new Generator((ulong)seed);
        var columns = new List<double[]>();
        foreach (var kind in kinds)
        {
            columns.Add([.. Enumerable.Range(0, rows).Select(i => kind switch
            {
                5 => 0,
                6 when columns.Count > 0 => columns[^1][i],
                7 when columns.Count > 1 => columns[0][i] - (2 * columns[^1][i]),
                4 => 1e9 * random.Uniform(),
                _ => (2 * random.Uniform()) - 1,
            })]);
        }

        return [.. columns];
    }
}
