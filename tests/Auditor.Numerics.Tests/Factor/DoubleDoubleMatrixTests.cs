using Auditor.Numerics.Factor;
using CsCheck;

namespace Auditor.Numerics.Tests.Factor;

/// <summary>Source: whole-number arithmetic without rounding (<see cref="Dyadic"/>).</summary>
public sealed class DoubleDoubleMatrixTests
{
    private const double Bits = 92;

    private static Gen<DoubleDoubleMatrix> Matrix =>
        from columns in Gen.Int[1, 6]
        from more in Gen.Int[0, 8]
        from values in Gen.Double[-3, 3].Array[columns * (columns + more)]
        from low in Gen.Double[-1e-17, 1e-17].Array[columns * (columns + more)]
        select Filled(columns + more, columns, values, low);

    /// <summary>Reflections change no product of two columns, and leave a triangle.</summary>
    [Fact]
    public void Reflections_keep_the_products_of_all_columns() => Matrix.Sample(matrix =>
    {
        var columns = matrix.Columns;
        var before = Products(matrix);
        int[] later = [.. Enumerable.Range(0, columns)];
        for (var c = 0; c < columns; c++)
        {
            matrix.Reflect(c, c, later.AsSpan(c + 1));
            Assert.True(matrix.Column(c)[(c + 1)..].IndexOfAnyExcept(default(DoubleDouble)) < 0);
        }

        var after = Products(matrix);
        for (var at = 0; at < before.Length; at++)
        {
            Dyadic.Near(before[at], after[at], (before[at / columns * (columns + 1)].Bits + before[at % columns * (columns + 1)].Bits) / 2, Bits);
        }
    });

    /// <summary>T x and T'x give b back, to the size of the terms that they add up.</summary>
    [Fact]
    public void Solutions_give_the_right_side_back() => Matrix.Sample(matrix =>
    {
        var size = matrix.Columns;
        for (var c = 0; c < size; c++)
        {
            matrix.Column(c)[c] += DoubleDouble.Of(4);
        }

        DoubleDouble[] b = [.. Enumerable.Range(1, size).Select(i => DoubleDouble.Of(1) / DoubleDouble.Of(i))];
        var (x, transposed) = ((DoubleDouble[])b.Clone(), (DoubleDouble[])b.Clone());
        matrix.Solve(x);
        matrix.SolveTransposed(transposed);
        for (var i = 0; i < size; i++)
        {
            Dyadic[] row = [.. Enumerable.Range(0, size).Select(c => c < i ? Dyadic.Of(0.0) : Dyadic.Of(matrix.Column(c)[i]))];
            Gives(row, x, b[i]);
            Gives(Dyadic.Exact(matrix.Column(i)[..(i + 1)]), transposed[..(i + 1)], b[i]);
        }
    });

    [Fact]
    public void Squared_rows_of_the_inverse_are_those_of_the_solved_unit_vectors()
    {
        var triangle = Filled(2, 2, [2, 0, 3, 7], new double[4]);

        // T = [2 3; 0 7], T^-1 = [1/2 -3/14; 0 1/7].
        Assert.Equal([0.25 + (9 / 196.0), 1 / 49.0], triangle.InverseRowSquares().Select(value => Math.Round(value, 15)), (a, b) => Math.Abs(a - b) < 2e-15);
    }

    private static void Gives(Dyadic[] row, DoubleDouble[] x, DoubleDouble b)
    {
        var size = row.Zip(x, (a, value) => (a * Dyadic.Of(value)).Bits).Append(Dyadic.Of(b).Bits).Max();
        Dyadic.Near(Dyadic.Of(b), Dyadic.Dot(row, Dyadic.Exact(x)), size, Bits);
    }

    private static Dyadic[] Products(DoubleDoubleMatrix matrix)
    {
        Dyadic[][] columns = [.. Enumerable.Range(0, matrix.Columns).Select(c => Dyadic.Exact(matrix.Column(c)))];
        return [.. columns.SelectMany(a => columns.Select(b => Dyadic.Dot(a, b)))];
    }

    private static DoubleDoubleMatrix Filled(int rows, int columns, double[] values, double[] low)
    {
        var matrix = new DoubleDoubleMatrix(rows, columns);
        for (var at = 0; at < values.Length; at++)
        {
            matrix.Column(at / rows)[at % rows] = DoubleDouble.Of(values[at]) + DoubleDouble.Of(low[at]);
        }

        return matrix;
    }
}
