namespace Auditor.Numerics.Factor;

/// <summary>
/// A small factorisation with rank decisions: columns are taken in order, one whose part orthogonal to the kept ones is too small is
/// passed over (aliased), every kept one takes the next pivot row. The columns carried along are rotated too.
/// </summary>
internal sealed class Reduction
{
    private readonly List<int> _kept = [];
    private readonly List<int> _aliased = [];
    private readonly List<NearlyAliasedColumn> _nearly = [];

    private Reduction(ColumnMatrix rotated, DoubleDoubleMatrix? precise) => (Rotated, Precise) = (rotated, precise);

    /// <summary>The matrix after all reflections: for kept column k, pivot row k.</summary>
    public ColumnMatrix Rotated { get; }

    /// <summary>The same in double-double, when the factor is; <see cref="Rotated"/> is it rounded.</summary>
    public DoubleDoubleMatrix? Precise { get; }

    /// <summary>Positions (in the matrix) of kept columns, in order; kept column k has pivot row <c>First + k</c>.</summary>
    public IReadOnlyList<int> Kept => _kept;

    public IReadOnlyList<int> Aliased => _aliased;

    /// <summary>Kept columns (design index) that cost digits.</summary>
    public IReadOnlyList<NearlyAliasedColumn> Nearly => _nearly;

    /// <param name="matrix">Used up: becomes <see cref="Rotated"/>.</param>
    /// <param name="candidates">How many leading columns of the matrix are to be factored; the rest are carried.</param>
    /// <param name="first">The pivot row of the first kept column; rows above belong to columns factored earlier.</param>
    /// <param name="design">The design index of each candidate, for the tolerance.</param>
    /// <param name="precise">The matrix in double-double, used up too; null when the factor is not.</param>
    public static Reduction Of(OrthogonalFactor factor, ColumnMatrix matrix, DoubleDoubleMatrix? precise, int candidates, int first, Func<int, int> design)
    {
        var reduction = new Reduction(matrix, precise);
        var later = Enumerable.Range(0, matrix.Columns).ToArray();
        for (var c = 0; c < candidates; c++)
        {
            reduction.Take(factor, c, first + reduction._kept.Count, design(c), later.AsSpan(c + 1));
        }

        return reduction;
    }

    private void Take(OrthogonalFactor factor, int column, int pivot, int design, ReadOnlySpan<int> later)
    {
        var part = pivot < Rotated.Rows ? Rotated.Column(column)[pivot..] : [];
        var orthogonal = Math.Sqrt(BlockKernels.Dot(part, part));
        if (part.IsEmpty || RankTolerance.IsAliased(factor, design, orthogonal))
        {
            _aliased.Add(column);
            return;
        }

        if (RankTolerance.DigitsLost(factor, design, orthogonal) is double lost)
        {
            _nearly.Add(new NearlyAliasedColumn(design, lost));
        }

        if (Precise is null)
        {
            Householder.Reflect(Rotated, column, pivot, later);
        }
        else
        {
            Precise.Reflect(column, pivot, later);
            Precise.RoundTo(Rotated);
        }

        _kept.Add(column);
    }
}
