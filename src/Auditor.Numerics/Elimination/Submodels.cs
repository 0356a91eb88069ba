using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Elimination;

/// <summary>
/// Every submodel of the largest model that an elimination asks for, computed from R alone and kept: its rank, its residual sum of squares, and
/// what each of its units adds to the rest of it. The response is a combination of k given columns (k = 1: one response; k = 3: the circle of
/// <see cref="ResponseCircle"/>), so one submodel serves every response of that kind.
/// </summary>
/// <remarks>
/// What a unit adds comes from the directions that only it spans: with T the triangle of the submodel's p columns, they are the span of T^-T e_j over its columns
/// j, so one factorisation serves all units. Where columns are aliased a unit's place could be taken by another's column, and each unit is then factored last.
/// </remarks>
internal sealed class Submodels(OrthogonalFactor factor, Candidates candidates, ColumnMatrix responses)
{
    private readonly Dictionary<UnitSet, Submodel> _known = [];

    public Candidates Candidates => candidates;

    public Submodel this[UnitSet set] => _known.TryGetValue(set, out var known) ? known : _known[set] = Make(set);

    private int K => responses.Columns;

    private Submodel Make(UnitSet set)
    {
        int[] columns = [.. candidates.Forced.Concat(InSet(set).SelectMany(unit => candidates.Units[unit].Columns)).Order()];
        var reduction = Reduce(columns);
        var rank = reduction.Kept.Count;
        var residual = SquareRoot.Of(reduction.Rotated, K, rank, reduction.Rotated.Rows - rank);
        var added = new AddedUnit?[candidates.Units.Count];
        foreach (var unit in InSet(set))
        {
            added[unit] = reduction.Aliased.Count == 0 ? Spanned(reduction, columns, unit) : Last(columns, unit);
        }

        return new Submodel(set, rank, residual, added);
    }

    private IEnumerable<int> InSet(UnitSet set) => Enumerable.Range(0, candidates.Units.Count).Where(set.Contains);

    private AddedUnit Spanned(Reduction reduction, int[] columns, int unit)
    {
        var (own, p) = (candidates.Units[unit].Columns, columns.Length);
        var matrix = new ColumnMatrix(p, own.Count + K);
        for (var c = 0; c < own.Count; c++)
        {
            matrix[Array.BinarySearch(columns, own[c]), c] = 1;
            Triangle.SolveTransposed(reduction.Rotated, matrix.Column(c));
        }

        for (var k = 0; k < K; k++)
        {
            reduction.Rotated.Column(p + k)[..p].CopyTo(matrix.Column(own.Count + k));
        }

        int[] later = [.. Enumerable.Range(0, matrix.Columns)];
        for (var c = 0; c < own.Count; c++)
        {
            Householder.Reflect(matrix, c, c, later.AsSpan(c + 1));
        }

        return new AddedUnit(own.Count, SquareRoot.Of(matrix, K, 0, own.Count));
    }

    private AddedUnit Last(int[] columns, int unit)
    {
        var own = candidates.Units[unit].Columns;
        int[] others = [.. columns.Except(own)];
        var reduction = Reduce([.. others, .. own]);
        var before = reduction.Kept.Count(position => position < others.Length);
        var rank = reduction.Kept.Count - before;
        return new AddedUnit(rank, SquareRoot.Of(reduction.Rotated, K, before, rank));
    }

    /// <summary>The columns factored in the given order, the response's columns carried along.</summary>
    private Reduction Reduce(int[] columns)
    {
        var matrix = new ColumnMatrix(factor.R.Rows, columns.Length + K);
        for (var c = 0; c < columns.Length; c++)
        {
            factor.R.Column(columns[c]).CopyTo(matrix.Column(c));
        }

        for (var k = 0; k < K; k++)
        {
            responses.Column(k).CopyTo(matrix.Column(columns.Length + k));
        }

        return Reduction.Of(factor, matrix, null, columns.Length, 0, position => columns[position]);
    }
}

/// <summary>One submodel: what it leaves over, and what each unit in it adds to the rest of it.</summary>
/// <param name="Added">By unit; null for a unit that is not in the submodel.</param>
internal sealed record Submodel(UnitSet Set, int Rank, SquareRoot Residual, AddedUnit?[] Added);

/// <param name="Rank">0 when the unit adds nothing to the rest of the submodel.</param>
internal sealed record AddedUnit(int Rank, SquareRoot SumOfSquares);
