namespace Auditor.Numerics.Factor;

/// <summary>A small dense column-major matrix of double-doubles with the reflections and solves that a precise factor needs. Plain loops: for small problems.</summary>
internal sealed class DoubleDoubleMatrix(int rows, int columns)
{
    /// <summary>A squared length below this is nothing: the errors of its products would underflow.</summary>
    private const double Nothing = 1e-200;

    private readonly DoubleDouble[] _values = new DoubleDouble[rows * columns];

    public int Rows { get; } = rows;

    public int Columns { get; } = columns;

    public Span<DoubleDouble> Column(int column) => _values.AsSpan(column * Rows, Rows);

    public DoubleDoubleMatrix Copy() => Select([.. Enumerable.Range(0, Columns)], 0, Rows);

    /// <summary>Some rows of the given columns, in that order, copied.</summary>
    public DoubleDoubleMatrix Select(IReadOnlyList<int> columns, int first, int count)
    {
        var selected = new DoubleDoubleMatrix(count, columns.Count);
        for (var c = 0; c < columns.Count; c++)
        {
            Column(columns[c]).Slice(first, count).CopyTo(selected.Column(c));
        }

        return selected;
    }

    public void RoundTo(ColumnMatrix rounded)
    {
        for (var c = 0; c < Columns; c++)
        {
            var from = Column(c);
            var to = rounded.Column(c);
            for (var i = 0; i < to.Length; i++)
            {
                to[i] = i < from.Length ? from[i].Value : 0;
            }
        }
    }

    /// <summary>As <see cref="Householder.Reflect"/>.</summary>
    public void Reflect(int column, int from, ReadOnlySpan<int> later)
    {
        DoubleDouble[] v = [.. Column(column)[from..]];
        var squared = Dot(v, v);
        if (squared.High < Nothing || v.AsSpan(1).IndexOfAnyExcept(default(DoubleDouble)) < 0)
        {
            return;
        }

        var length = DoubleDouble.Sqrt(squared);
        var image = v[0].High > 0 ? -length : length;
        v[0] -= image;
        var factor = DoubleDouble.Of(1) / (image * v[0]); // v'v = -2 image v_0
        var own = Column(column)[from..];
        own.Clear();
        own[0] = image;
        foreach (var c in later)
        {
            var other = Column(c)[from..];
            AddScaled(other, factor * Dot(v, other), v);
        }
    }

    /// <summary>x with T x = b, T the leading triangle as large as b; b is replaced.</summary>
    public void Solve(Span<DoubleDouble> b)
    {
        for (var j = b.Length - 1; j >= 0; j--)
        {
            b[j] /= Column(j)[j];
            AddScaled(b[..j], -b[j], Column(j)[..j]);
        }
    }

    /// <summary>x with T'x = b; b is replaced.</summary>
    public void SolveTransposed(Span<DoubleDouble> b)
    {
        for (var j = 0; j < b.Length; j++)
        {
            b[j] = (b[j] - Dot(Column(j)[..j], b[..j])) / Column(j)[j];
        }
    }

    /// <summary>Squared lengths of the rows of T^-1, the diagonal of (T'T)^-1.</summary>
    public double[] InverseRowSquares()
    {
        var squares = new double[Columns];
        for (var j = 0; j < Columns; j++)
        {
            var column = new DoubleDouble[j + 1];
            column[j] = DoubleDouble.Of(1);
            Solve(column);
            for (var i = 0; i <= j; i++)
            {
                squares[i] += column[i].Value * column[i].Value;
            }
        }

        return squares;
    }

    public static DoubleDouble Dot(ReadOnlySpan<DoubleDouble> a, ReadOnlySpan<DoubleDouble> b)
    {
        var total = default(DoubleDouble);
        for (var i = 0; i < a.Length; i++)
        {
            total += a[i] * b[i];
        }

        return total;
    }

    private static void AddScaled(Span<DoubleDouble> into, DoubleDouble factor, ReadOnlySpan<DoubleDouble> column)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] += column[i] * factor;
        }
    }
}
