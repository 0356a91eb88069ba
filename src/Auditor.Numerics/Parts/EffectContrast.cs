using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Parts;

/// <summary>
/// What different effects of a group in K parts of the rows add to equal ones, the final model's coefficients free in each part. Reduced model: F x part + Z; full
/// model: F x part + Z x part, which is the fit of F + Z in each part by itself. Everything follows from the fits in the parts: with u_k = Qz_k'y and S_k = Qz_k'Z~_k,
/// equal effects c mean E(u_k) = S_k c, so with L an orthonormal basis of what is orthogonal to the stacked S_k, Q_d = diag(Qz_k) L is an orthonormal basis of the
/// columns Z x part residualised on the reduced model, and d = L'u = Q_d'y. No row is looked at again.
/// </summary>
/// <remarks>
/// Frisch–Waugh–Lovell. Free coefficients of F keep a difference in those from passing as one of the group, and they are the models of the parts' own tests. Verified
/// against R's interaction models (Parts/values of the tests) and against the same columns written out.
/// </remarks>
public sealed class EffectContrast
{
    /// <summary>Columns times parts above this are not compared: the work grows with the third power.</summary>
    private const int MostDirections = 600;

    private readonly ColumnMatrix _rotated;
    private readonly int[] _firstOf;
    private readonly int _common;

    private EffectContrast(IReadOnlyList<AddedGroup> parts, ColumnMatrix rotated, int common)
    {
        (Parts, _rotated, _common) = (parts, rotated, common);
        _firstOf = [.. parts.Select((_, k) => parts.Take(k).Sum(part => part.Rank))];
        U = rotated.Column(0)[common..].ToArray();
    }

    /// <summary>The group added to F in each part.</summary>
    public IReadOnlyList<AddedGroup> Parts { get; }

    /// <summary>d, as many entries as directions in which the effects can differ: columns of the group times K - 1 where none is aliased.</summary>
    public IReadOnlyList<double> U { get; }

    /// <summary>df1 of every test that the effects are equal.</summary>
    public int Rank => U.Count;

    /// <summary>Observations of all parts.</summary>
    public double N => Parts.Sum(part => part.Final.Factor.Totals.N);

    /// <summary>Residual sum of squares of the full model.</summary>
    public double RssWith => Parts.Sum(part => part.RssWith);

    /// <summary>n less the rank of the full model.</summary>
    public double ResidualDf => Parts.Sum(PartialF.ResidualDf);

    public double SumOfSquares => BlockKernels.Dot((double[])U, (double[])U);

    /// <summary>What the reduced model's group explains of u, in the coordinates of one part's Qz.</summary>
    internal double[] Common(int part) => Along(part, common: true, _rotated.Column(0)[.._common]);

    /// <summary>What the contrast itself explains of u, likewise.</summary>
    internal double[] Fitted(int part) => Along(part, common: false, (double[])U);

    /// <param name="parts">The same group, by the same columns, in each part.</param>
    /// <returns>Null when the directions are too many to compare.</returns>
    public static EffectContrast? Of(IReadOnlyList<AddedGroup> parts)
    {
        var directions = parts.Sum(part => part.Rank);
        if (directions > MostDirections || parts.Count == 0)
        {
            return null;
        }

        var rotated = Stacked(parts, directions);
        return new EffectContrast(parts, rotated, Reduce(rotated, parts[0].Columns.Count));
    }

    /// <summary>What keeps every form of the test from being computed.</summary>
    public Impediment? Why()
    {
        if (Rank == 0)
        {
            return Impediment.NothingToCompare;
        }

        return ResidualDf <= 0 ? Impediment.NoResidualDegreesOfFreedom
            : Parts.All(part => PerfectFit.Is(part.Final, part.RssWith)) ? Impediment.PerfectWithGroup
            : null;
    }

    /// <summary>The variance that a score matrix is measured by, as for a group.</summary>
    internal double ScoreScale => Math.Min(RssWith / ResidualDf, SumOfSquares / N);

    /// <summary>Adds to the contrast's entries a vector that stands in the coordinates of one part's Qz: into += L_k'v.</summary>
    internal void Turn(int part, ReadOnlySpan<double> v, Span<double> into)
    {
        for (var a = 0; a < v.Length; a++)
        {
            BlockKernels.AddScaled(into, v[a], Entry(part, a)[_common..]);
        }
    }

    /// <summary>The same onto the reduced model's own directions of the group: into += B_k'v, as many entries as these are.</summary>
    internal void TurnCommon(int part, ReadOnlySpan<double> v, Span<double> into)
    {
        for (var a = 0; a < v.Length; a++)
        {
            BlockKernels.AddScaled(into, v[a], Entry(part, a)[.._common]);
        }
    }

    /// <summary>Directions that the group has with equal effects.</summary>
    internal int CommonRank => _common;

    /// <summary>Row a of part k of [B L]: entries 0 to common - 1 span the stacked S, the rest is orthogonal to it.</summary>
    private ReadOnlySpan<double> Entry(int part, int a) => _rotated.Column(1 + _firstOf[part] + a);

    private double[] Along(int part, bool common, ReadOnlySpan<double> coordinates)
    {
        var along = new double[Parts[part].Rank];
        for (var a = 0; a < along.Length; a++)
        {
            along[a] = BlockKernels.Dot(common ? Entry(part, a)[.._common] : Entry(part, a)[_common..], coordinates);
        }

        return along;
    }

    /// <summary>[u I S]: what is carried first, then the columns to be factored.</summary>
    private static ColumnMatrix Stacked(IReadOnlyList<AddedGroup> parts, int directions)
    {
        var columns = parts[0].Columns.Count;
        var (stacked, row) = (new ColumnMatrix(directions, 1 + directions + columns), 0);
        for (var i = 0; i < directions; i++)
        {
            stacked[i, 1 + i] = 1;
        }

        foreach (var part in parts)
        {
            ((double[])[.. part.U]).CopyTo(stacked.Column(0)[row..]);
            for (var c = 0; c < columns; c++)
            {
                part.Coordinates(c).CopyTo(stacked.Column(1 + directions + c)[row..]);
            }

            row += part.Rank;
        }

        return stacked;
    }

    /// <summary>Factors S with a decision on its rank, which is returned; what is carried is rotated along.</summary>
    private static int Reduce(ColumnMatrix stacked, int columns)
    {
        var (rank, first) = (0, stacked.Columns - columns);
        for (var c = 0; c < columns && rank < stacked.Rows; c++)
        {
            var whole = stacked.Column(first + c);
            if (Length(whole[rank..]) > RankTolerance.Aliased * Length(whole))
            {
                Householder.Reflect(stacked, first + c, rank, [.. Enumerable.Range(0, first), .. Enumerable.Range(first + c + 1, columns - c - 1)]);
                rank++;
            }
        }

        return rank;
    }

    private static double Length(ReadOnlySpan<double> values) => Math.Sqrt(BlockKernels.Dot(values, values));
}
