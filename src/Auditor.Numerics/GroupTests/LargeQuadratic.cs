using Auditor.Numerics.Factor;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// The quadratic form of a large group: Cholesky by rows, eight rows at a time, so that each earlier row is read once for eight.
/// </summary>
/// <remarks>Compared with the Cholesky factor of MathNet.Numerics in the tests.</remarks>
internal sealed class LargeQuadratic
{
    private const int Width = PanelKernels.Width;

    private readonly double[,] _v;
    private readonly Func<double, double, bool> _isRounding;
    private readonly int _q;
    private readonly int _stride;

    /// <summary>Row i of the factor from i times the stride; zero beyond the diagonal.</summary>
    private readonly double[] _l;

    private LargeQuadratic(double[,] v, Func<double, double, bool> isRounding)
    {
        (_v, _isRounding, _q) = (v, isRounding, v.GetLength(0));
        _stride = StackedPanels.WholeSteps(_q);
        _l = new double[_stride * ((_q + Width - 1) / Width * Width)];
    }

    /// <summary>u' V^-1 u, null when V is singular or not positive definite.</summary>
    /// <param name="isRounding">Whether a pivot, given with its diagonal entry, is nothing but rounding.</param>
    public static double? Form(IReadOnlyList<double> u, double[,] v, Func<double, double, bool> isRounding)
    {
        var factor = new LargeQuadratic(v, isRounding);
        return factor.Compute() && factor.SolvedSquares(u) is var total && double.IsFinite(total) ? total : null;
    }

    private bool Compute()
    {
        for (var first = 0; first < _q; first += Width)
        {
            var end = Math.Min(first + Width, _q);
            Left(first, end);
            for (var i = first; i < end; i++)
            {
                if (!Diagonal(first, i))
                {
                    return false;
                }
            }
        }

        return true;
    }

    /// <summary>Rows first to end - 1 left of their own square.</summary>
    private void Left(int first, int end)
    {
        for (var j = 0; j < first; j++)
        {
            // The eight rows hold zeros from column j on, so that whole steps add nothing.
            var products = PanelKernels.Dots(ref _l[first * _stride], (nuint)_stride, ref _l[j * _stride], (nuint)StackedPanels.WholeSteps(j));
            for (var i = first; i < end; i++)
            {
                _l[(i * _stride) + j] = (_v[i, j] - products[i - first]) / _l[(j * _stride) + j];
            }
        }
    }

    /// <summary>Row i within its own square.</summary>
    private bool Diagonal(int first, int i)
    {
        for (var j = first; j < i; j++)
        {
            _l[(i * _stride) + j] = (_v[i, j] - Product(i, j, j)) / _l[(j * _stride) + j];
        }

        var pivot = _v[i, i] - Product(i, i, i);
        _l[(i * _stride) + i] = Math.Sqrt(Math.Max(0, pivot));
        return !_isRounding(pivot, _v[i, i]);
    }

    private double Product(int i, int j, int length) => BlockKernels.Dot(_l.AsSpan(i * _stride, length), _l.AsSpan(j * _stride, length));

    /// <summary>|L^-1 u|².</summary>
    private double SolvedSquares(IReadOnlyList<double> u)
    {
        var z = new double[_q];
        for (var i = 0; i < _q; i++)
        {
            z[i] = (u[i] - BlockKernels.Dot(_l.AsSpan(i * _stride, i), z.AsSpan(0, i))) / _l[(i * _stride) + i];
        }

        return BlockKernels.Dot(z, z);
    }
}
