using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace Auditor.Numerics.Factor;

/// <summary>
/// Factors a block of rows stacked under a triangle into the triangle, eight reflections at a time. With v_j = [t_j e_j; b_j] the reflections of a panel are
/// I - V S V' (compact form), V = [T; B], T diagonal: they touch the panel's own eight rows of the triangle and all rows of the block.
/// </summary>
/// <remarks>
/// Compact WY form: Schreiber and Van Loan 1989, SIAM J. Sci. Stat. Comput. 10 (from memory). Checked against reflections one by one in the tests.
/// One instance for each thread: it holds the panel's small matrices.
/// </remarks>
internal sealed class StackedPanels(ColumnMatrix triangle)
{
    private const int Width = PanelKernels.Width;

    /// <summary>A block of fewer rows is reflected column by column: panels have nothing to gain there, and lose a fraction of a digit.</summary>
    private const int FewestRows = 256;

    private readonly double[] _tops = new double[Width];
    private readonly double[] _scales = new double[Width];
    private readonly double[] _dots = new double[Width];
    private readonly double[] _products = new double[Width * Width];

    /// <summary>S, row by row.</summary>
    private readonly double[] _compact = new double[Width * Width];

    private double[] _block = [];
    private int _stride;

    public ColumnMatrix Triangle => triangle;

    /// <param name="block">Column-major, used up. Rows from the last one in use to the next multiple of <see cref="PanelKernels.RowStep"/> must be zero.</param>
    /// <param name="triangular">The block's column c holds zeros below its row c, so that most of the work falls away.</param>
    public void Stack(double[] block, int stride, int rows, bool triangular)
    {
        if (!triangular && rows < FewestRows)
        {
            Householder.Stack(triangle, block, stride, rows);
            return;
        }

        (_block, _stride) = (block, stride);
        for (var first = 0; first < triangle.Columns; first += Width)
        {
            var end = Math.Min(first + Width, triangle.Columns);
            var reach = WholeSteps(triangular ? Math.Min(end, rows) : rows);
            FactorPanel(first, end, reach);
            if (end < triangle.Columns)
            {
                FormCompact(first, reach);
                ApplyToRest(first, reach);
            }
        }
    }

    public static int WholeSteps(int rows) => (rows + PanelKernels.RowStep - 1) / PanelKernels.RowStep * PanelKernels.RowStep;

    private ref double Column(int column) => ref MemoryMarshal.GetReference(_block.AsSpan(column * _stride));

    private void FactorPanel(int first, int end, int rows)
    {
        for (var k = first; k < end; k++)
        {
            _dots[k - first] = Dot(first, k, rows);
        }

        for (var j = first; j < end; j++)
        {
            Reflect(first, j, end, rows);
        }
    }

    /// <summary>Reflects column j and the panel's columns after it; leaves the products of column j + 1 with itself and those after it.</summary>
    private void Reflect(int first, int j, int end, int rows)
    {
        var squared = _dots[j - first];
        var diagonal = triangle[j, j];
        if (squared < Householder.Nothing)
        {
            (_tops[j - first], _scales[j - first]) = (0, 0);
        }
        else
        {
            var length = Math.Sqrt(Math.FusedMultiplyAdd(diagonal, diagonal, squared));
            var image = diagonal > 0 ? -length : length;
            triangle[j, j] = image;
            _tops[j - first] = diagonal - image;

            // v'v = -2 image top, so the reflection I - 2 v v' / v'v is I + v v' / (image top).
            _scales[j - first] = 1 / (image * (diagonal - image));
        }

        for (var k = j + 1; k < end; k++)
        {
            var top = _tops[j - first];
            _dots[k - first] = _scales[j - first] * Math.FusedMultiplyAdd(top, triangle[j, k], _dots[k - first]);
            triangle[j, k] = Math.FusedMultiplyAdd(_dots[k - first], top, triangle[j, k]);
        }

        UpdatePanel(first, j, end, (nuint)rows);
    }

    /// <summary>Adds _dots[k] times column j to the panel's later columns k, and puts the products with column j + 1 in their place.</summary>
    private void UpdatePanel(int first, int j, int end, nuint rows)
    {
        var (next, k) = (j + 1, j + 2);
        if (next >= end)
        {
            return;
        }

        var d = _dots.AsSpan(-first + next);
        if ((end - next) % 2 == 1)
        {
            d[0] = PanelKernels.UpdateLead(ref Column(j), ref Column(next), d[0], rows);
        }
        else
        {
            (d[0], d[1]) = PanelKernels.UpdateLead(ref Column(j), ref Column(next), ref Column(k), d[0], d[1], rows);
            k++;
        }

        for (; k < end; k += 2)
        {
            d = _dots.AsSpan(k - first);
            (d[0], d[1]) = PanelKernels.UpdatePair(ref Column(j), ref Column(next), ref Column(k), ref Column(k + 1), d[0], d[1], rows);
        }
    }

    private double Dot(int a, int b, int rows) =>
        BlockKernels.Dot(_block.AsSpan(a * _stride, rows), _block.AsSpan(b * _stride, rows));

    /// <summary>S is upper triangular: S_jj = -scale_j, S_ij = scale_j times row i of S so far with the products of v_j.</summary>
    private void FormCompact(int first, int rows)
    {
        PanelProducts.Fill(ref Column(first), (nuint)_stride, (nuint)rows, _products);
        for (var j = 0; j < Width; j++)
        {
            _compact[(j * Width) + j] = -_scales[j];
            for (var i = 0; i < j; i++)
            {
                var sum = 0.0;
                for (var l = i; l < j; l++)
                {
                    sum = Math.FusedMultiplyAdd(_compact[(i * Width) + l], _products[(j * Width) + l], sum);
                }

                _compact[(i * Width) + j] = _scales[j] * sum;
            }
        }
    }

    private void ApplyToRest(int first, int rows)
    {
        ref var panel = ref Column(first);
        var (stride, tall) = ((nuint)_stride, (nuint)rows);
        var tops = Vector512.LoadUnsafe(ref _tops[0]);
        var c = first + Width;
        for (; c + 1 < triangle.Columns; c += 2)
        {
            var (a, b) = PanelKernels.Dots(ref panel, stride, ref Column(c), ref Column(c + 1), tall);
            (a, b) = (Factors(a, tops, first, c), Factors(b, tops, first, c + 1));
            PanelKernels.Subtract(ref panel, stride, ref Column(c), ref Column(c + 1), tall, a, b);
        }

        if (c < triangle.Columns)
        {
            var a = Factors(PanelKernels.Dots(ref panel, stride, ref Column(c), tall), tops, first, c);
            PanelKernels.Subtract(ref panel, stride, ref Column(c), tall, a);
        }
    }

    /// <summary>S'V'c for column c, from the block's part of V'c; the column's eight rows of the triangle are updated.</summary>
    private Vector512<double> Factors(Vector512<double> dots, Vector512<double> tops, int first, int c)
    {
        ref var above = ref triangle.Column(c)[first];
        var old = Vector512.LoadUnsafe(ref above);
        var products = Vector512.FusedMultiplyAdd(tops, old, dots);
        var factors = Vector512<double>.Zero;
        for (var k = 0; k < Width; k++)
        {
            factors = Vector512.FusedMultiplyAdd(Vector512.Create(products[k]), Vector512.LoadUnsafe(ref _compact[k * Width]), factors);
        }

        Vector512.FusedMultiplyAdd(-tops, factors, old).StoreUnsafe(ref above);
        return factors;
    }
}
