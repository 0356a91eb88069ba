namespace Auditor.Numerics.Factor;

/// <summary>
/// What columns Z add to the final model F (or to F and other columns before them): all that a group test needs. Z is residualised on
/// what stands before it, the rest is factored into an orthonormal Qz with q columns, q being the rank really added, and u = Qz'y.
/// The triangular factor cancels from every test, so nothing depends on how levels are coded, and aliased columns never enter.
/// </summary>
/// <remarks>Frisch–Waugh–Lovell; sums of squares come from u, not from a difference of two residual sums of squares.</remarks>
public sealed class AddedGroup
{
    private readonly Dictionary<int, double[]> _aliasedCoordinates = [];

    /// <param name="before">How many leading columns of the reduction stand before Z.</param>
    /// <param name="rankOutside">Rank of what was taken out before the reduction, beside F; null when nothing was.</param>
    private AddedGroup(FinalFactor final, IReadOnlyList<int> columns, int before, Reduction reduction, int? rankOutside = null)
    {
        Final = final;
        Columns = columns;
        var rankBefore = reduction.Kept.Count(position => position < before);
        KeptPositions = [.. reduction.Kept.Skip(rankBefore)];
        Kept = [.. KeptPositions.Select(position => columns[position - before])];
        NearlyAliased = [.. reduction.Nearly.Where(near => columns.Contains(near.Column))];
        var y = reduction.Rotated.Column(reduction.Rotated.Columns - 1)[rankBefore..];
        U = y[..Kept.Count].ToArray();
        RssWith = BlockKernels.Dot(y[Kept.Count..], y[Kept.Count..]);
        RankBefore = final.Rank + rankBefore + (rankOutside ?? 0);
        Triangle = new ColumnMatrix(Kept.Count, Kept.Count);
        for (var c = 0; c < Kept.Count; c++)
        {
            reduction.Rotated.Column(KeptPositions[c]).Slice(rankBefore, c + 1).CopyTo(Triangle.Column(c));
        }

        PreciseTriangle = reduction.Precise?.Select(KeptPositions, rankBefore, Kept.Count);
        Aliased = before > 0 || rankOutside is not null
            ? []
            : [.. reduction.Aliased.Select(position => Combinations.OfGroupColumn(this, columns[position], reduction.Rotated.Column(position)))];
        foreach (var position in Aliased.Count > 0 ? reduction.Aliased : [])
        {
            _aliasedCoordinates[position] = AliasedCoordinates(position, reduction.Rotated.Column(position));
        }
    }

    public FinalFactor Final { get; }

    /// <summary>Design columns of Z.</summary>
    public IReadOnlyList<int> Columns { get; }

    /// <summary>Design columns of Z that add a direction; q of them.</summary>
    public IReadOnlyList<int> Kept { get; }

    /// <summary>Rank q added: df1 of every test of the group.</summary>
    public int Rank => Kept.Count;

    /// <summary>Rank of what stands before Z.</summary>
    public int RankBefore { get; }

    /// <summary>Rank with Z.</summary>
    public int RankWith => RankBefore + Rank;

    /// <summary>u = Qz'y, q entries; u'u is the extra sum of squares.</summary>
    public IReadOnlyList<double> U { get; }

    public double SumOfSquares => U.Sum(value => value * value);

    /// <summary>Residual sum of squares with Z in the model.</summary>
    public double RssWith { get; }

    public double RssWithout => RssWith + SumOfSquares;

    /// <summary>Columns of Z that equal a combination of F and earlier columns of Z (given only when nothing else stands before Z).</summary>
    public IReadOnlyList<AliasedColumn> Aliased { get; }

    public IReadOnlyList<NearlyAliasedColumn> NearlyAliased { get; }

    /// <summary>q x q triangle R_z with Z~ = Qz R_z.</summary>
    internal ColumnMatrix Triangle { get; }

    /// <summary>The same in double-double, when the factor is.</summary>
    internal DoubleDoubleMatrix? PreciseTriangle { get; }

    private IReadOnlyList<int> KeptPositions { get; }

    /// <summary>
    /// Qz'Z~ of one column of Z, q entries: an aliased one is a combination of the columns kept before it, or zero where F explains it. Only when nothing else
    /// stands before Z.
    /// </summary>
    /// <param name="place">Place of the column within <see cref="Columns"/>.</param>
    internal double[] Coordinates(int place)
    {
        if (_aliasedCoordinates.TryGetValue(place, out var aliased))
        {
            return aliased;
        }

        var (coordinates, k) = (new double[Rank], KeptPositions.Index().First(kept => kept.Item == place).Index);
        Triangle.Column(k)[..(k + 1)].CopyTo(coordinates);
        return coordinates;
    }

    /// <summary>Z added to F.</summary>
    public static AddedGroup Of(FinalFactor final, IReadOnlyList<int> columns) => After(final, [], columns);

    /// <summary>Z added to F and the columns before it, such as all other groups ("last in").</summary>
    public static AddedGroup After(FinalFactor final, IReadOnlyList<int> before, IReadOnlyList<int> columns)
    {
        int[] all = [.. before, .. columns];
        int[] carried = [.. all, final.Factor.Layout.Response];
        var reduction = Reduction.Of(final.Factor, final.OrthogonalPart(carried), final.PreciseOrthogonal(carried), all.Length, 0, position => all[position]);
        return new AddedGroup(final, columns, before.Count, reduction);
    }

    /// <param name="alone">Z and y, already orthogonal to all that stands before Z, reduced.</param>
    internal static AddedGroup LastIn(FinalFactor final, IReadOnlyList<int> columns, Reduction alone, int rankOutside) =>
        new(final, columns, 0, alone, rankOutside);

    private double[] AliasedCoordinates(int position, ReadOnlySpan<double> rotated)
    {
        var (coordinates, before) = (new double[Rank], KeptPositions.Count(kept => kept < position));
        var part = rotated[..before];
        if (!RankTolerance.IsAliased(Final.Factor, Columns[position], Math.Sqrt(BlockKernels.Dot(part, part))))
        {
            part.CopyTo(coordinates);
        }

        return coordinates;
    }
}
