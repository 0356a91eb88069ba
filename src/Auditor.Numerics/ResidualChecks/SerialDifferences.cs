using System.Numerics;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// The Durbin–Watson ratio d = e'Ae / e'e of residuals e = M u, u n standard normal errors, M = I - QQ', Q n x r: e'Ae sums the squared differences of rows that
/// follow each other, so A is tridiagonal in time order.
/// </summary>
internal sealed class SerialDifferences
{
    private readonly ColumnMatrix _q;
    private readonly double[] _diagonal;
    private readonly bool[] _linked;

    /// <param name="q">Orthonormal columns, rows in time order.</param>
    /// <param name="linked">Whether each row follows the one before it.</param>
    public SerialDifferences(ColumnMatrix q, bool[] linked)
    {
        (_q, _linked, _diagonal) = (q, linked, new double[linked.Length]);
        for (var i = 1; i < linked.Length; i++)
        {
            _diagonal[i] += linked[i] ? 1 : 0;
            _diagonal[i - 1] += linked[i] ? 1 : 0;
        }

        (Mean, Variance) = Moments();
    }

    /// <summary>n.</summary>
    public int Rows => _q.Rows;

    /// <summary>n - r.</summary>
    public int Df => _q.Rows - _q.Columns;

    /// <summary>Expected value of d: tr(MA) / (n - r).</summary>
    public double Mean { get; }

    /// <summary>2 [tr((MA)²) - tr(MA)² / (n - r)] / [(n - r)(n - r + 2)].</summary>
    public double Variance { get; }

    /// <summary>
    /// Logarithm of E exp(s u'M(A - dI)M u) = det(I - 2s M(A - dI)M)^(-1/2). The determinant is det(T) det(Q'T^-1 Q) with T = I - 2s(A - dI), tridiagonal, so an
    /// LDL' of T and one of an r x r matrix give it in O(n r²). With the real part of T positive definite every pivot has a positive real part,
    /// and the sum of their principal logarithms is the branch that is 0 at s = 0.
    /// </summary>
    public Complex LogTransform(Complex s, double d)
    {
        var (rows, columns) = (_q.Rows, _q.Columns);
        var (row, gram) = (new Complex[columns], new Complex[columns * columns]);
        var (log, inverse) = (Complex.Zero, Complex.Zero);
        for (var i = 0; i < rows; i++)
        {
            var off = _linked[i] ? 2 * s : 0;
            var step = off * inverse;
            var pivot = 1 - (2 * s * (_diagonal[i] - d)) - (off * step);
            log += Complex.Log(pivot);
            inverse = 1 / pivot;
            for (var a = 0; a < columns; a++)
            {
                row[a] = _q[i, a] - (step * row[a]);
                var scaled = row[a] * inverse;
                for (var b = 0; b <= a; b++)
                {
                    gram[(a * columns) + b] += scaled * row[b];
                }
            }
        }

        return -(log + LogDeterminant(gram, columns)) / 2;
    }

    /// <param name="lower">The lower triangle of a complex symmetric matrix, by rows; used up.</param>
    private static Complex LogDeterminant(Complex[] lower, int size)
    {
        var log = Complex.Zero;
        for (var k = 0; k < size; k++)
        {
            var pivot = lower[(k * size) + k];
            log += Complex.Log(pivot);
            for (var a = k + 1; a < size; a++)
            {
                var factor = lower[(a * size) + k] / pivot;
                for (var b = k + 1; b <= a; b++)
                {
                    lower[(a * size) + b] -= factor * lower[(b * size) + k];
                }
            }
        }

        return log;
    }

    /// <summary>tr(MA) = tr A - tr(Q'AQ); tr(MAMA) = tr A² - 2 |AQ|² + |Q'AQ|².</summary>
    private (double Mean, double Variance) Moments()
    {
        var product = Product();
        var first = _diagonal.Sum();
        var second = _diagonal.Sum(value => value * value) + (2 * _linked.Count(linked => linked));
        for (var a = 0; a < _q.Columns; a++)
        {
            first -= BlockKernels.Dot(_q.Column(a), product.Column(a));
            second -= 2 * BlockKernels.Dot(product.Column(a), product.Column(a));
            for (var b = 0; b < _q.Columns; b++)
            {
                var inner = BlockKernels.Dot(_q.Column(a), product.Column(b));
                second += inner * inner;
            }
        }

        return (first / Df, 2 * (second - (first * first / Df)) / (Df * (Df + 2.0)));
    }

    /// <summary>AQ.</summary>
    private ColumnMatrix Product()
    {
        var product = new ColumnMatrix(_q.Rows, _q.Columns);
        for (var a = 0; a < _q.Columns; a++)
        {
            for (var i = 1; i < _q.Rows; i++)
            {
                var difference = _linked[i] ? _q[i, a] - _q[i - 1, a] : 0;
                product[i, a] += difference;
                product[i - 1, a] -= difference;
            }
        }

        return product;
    }
}
