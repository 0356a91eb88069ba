namespace Auditor.Numerics.Factor;

/// <summary>
/// The final model F within a factor: its rank r, the triangle of its kept columns, and every other column of the design in coordinates that split
/// into the part that F explains (r rows) and the part orthogonal to F (the rest).
/// </summary>
public sealed class FinalFactor
{
    private readonly ColumnMatrix _rotated;
    private readonly DoubleDoubleMatrix? _precise;

    private FinalFactor(OrthogonalFactor factor, Reduction reduction)
    {
        Factor = factor;
        _rotated = reduction.Rotated;
        _precise = reduction.Precise;
        Kept = reduction.Kept;
        NearlyAliased = reduction.Nearly;
        Triangle = Leading(reduction.Kept);
        Aliased = [.. reduction.Aliased.Select(column => Combinations.OfFinalColumn(this, column))];
        var orthogonal = Orthogonal(factor.Layout.Response);
        Rss = BlockKernels.Dot(orthogonal, orthogonal);
        LargestPiece = FindLargestPiece();
    }

    public OrthogonalFactor Factor { get; }

    /// <summary>Design columns of F that span it, in declared order; r of them.</summary>
    public IReadOnlyList<int> Kept { get; }

    public int Rank => Kept.Count;

    public IReadOnlyList<AliasedColumn> Aliased { get; }

    public IReadOnlyList<NearlyAliasedColumn> NearlyAliased { get; }

    /// <summary>Residual sum of squares of y on F.</summary>
    public double Rss { get; }

    /// <summary>The largest of the lengths that a fit adds up: the response's, and each column's in the fit of the response.</summary>
    internal double LargestPiece { get; }

    /// <summary>r x r upper triangle R_F of the kept columns.</summary>
    internal ColumnMatrix Triangle { get; }

    public static FinalFactor Of(OrthogonalFactor factor)
    {
        var all = factor.R.Select([.. Enumerable.Range(0, factor.R.Columns)]);
        return new FinalFactor(factor, Reduction.Of(factor, all, factor.Precise?.Copy(), factor.Layout.FinalColumns, 0, column => column));
    }

    /// <summary>Coordinates of a design column within F; r entries.</summary>
    internal ReadOnlySpan<double> Explained(int column) => _rotated.Column(column)[..Kept.Count];

    /// <summary>The same, for use after the call.</summary>
    internal ReadOnlyMemory<double> ExplainedMemory(int column) => _rotated.ColumnMemory(column)[..Kept.Count];

    /// <summary>Coordinates of a design column orthogonal to F.</summary>
    internal ReadOnlySpan<double> Orthogonal(int column) => _rotated.Column(column)[Kept.Count..];

    /// <summary>Coordinates of design columns orthogonal to F, copied.</summary>
    internal ColumnMatrix OrthogonalPart(IReadOnlyList<int> columns) => _rotated.Select(columns, Rank, _rotated.Rows - Rank);

    /// <summary>The kept columns' triangle in double-double, when the factor is.</summary>
    internal DoubleDoubleMatrix? PreciseTriangle => _precise?.Select(Kept, 0, Rank);

    /// <summary>Coordinates of design columns orthogonal to F in double-double, when the factor is.</summary>
    internal DoubleDoubleMatrix? PreciseOrthogonal(IReadOnlyList<int> columns) => _precise?.Select(columns, Rank, _precise.Rows - Rank);

    /// <summary>Coordinates of a design column within F in double-double; r entries. Only when the factor is extended.</summary>
    internal ReadOnlySpan<DoubleDouble> PreciseExplained(int column) => _precise!.Column(column)[..Rank];

    /// <summary>b with R_F b = Q_F'y for the columns as factored; r entries.</summary>
    internal DoubleDouble[] Slopes()
    {
        if (_precise is null)
        {
            var plain = Explained(Factor.Layout.Response).ToArray();
            Numerics.Factor.Triangle.Solve(Triangle, plain);
            return [.. plain.Select(DoubleDouble.Of)];
        }

        var slopes = _precise.Column(Factor.Layout.Response)[..Rank].ToArray();
        PreciseTriangle!.Solve(slopes);
        return slopes;
    }

    private double FindLargestPiece()
    {
        var rows = Math.Sqrt(Factor.Totals.SumOfWeights);
        var response = Factor.Layout.Response;
        var slopes = Explained(response).ToArray();
        Numerics.Factor.Triangle.Solve(Triangle, slopes);
        var pieces = Kept.Select((column, k) => Math.Abs(slopes[k]) * Factor.LargestValues[column] * rows);
        return pieces.Append(Factor.LargestValues[response] * rows).Max();
    }

    private ColumnMatrix Leading(IReadOnlyList<int> columns)
    {
        var triangle = new ColumnMatrix(columns.Count, columns.Count);
        for (var c = 0; c < columns.Count; c++)
        {
            _rotated.Column(columns[c])[..(c + 1)].CopyTo(triangle.Column(c));
        }

        return triangle;
    }
}
