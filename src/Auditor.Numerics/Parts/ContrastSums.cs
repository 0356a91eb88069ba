using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Parts;

/// <summary>One part's sums by cluster, unit or period, and which class of all parts each of its classes is.</summary>
/// <param name="Codes">For each class of the part, the code of the same cluster, unit or period over all parts, 0 to count - 1; periods in the order of time.</param>
public sealed record PartClasses(ClassSums Sums, IReadOnlyList<int> Codes);

/// <summary>
/// Sums of a contrast by cluster, unit or period over all parts; a class may have rows in several. Made from the parts' own sums: a row's entry of Q_d is L_k'qz, its
/// residual under equal effects e(F) - qz'B c, and the columns that stand before it are Q_F of its part and diag(Qz_k) B.
/// </summary>
public sealed class ContrastSums
{
    /// <summary>A sum of squared rows of Q_d below this is rounding.</summary>
    private const double ZeroSquares = 1e-24;

    private readonly EffectContrast _contrast;
    private readonly double[] _scores;
    private readonly double[] _fitted;
    private readonly double[] _squares;

    private ContrastSums(EffectContrast contrast, int count)
    {
        (_contrast, Count) = (contrast, count);
        _scores = new double[count * contrast.Rank];
        _fitted = new double[count * contrast.Rank];
        _squares = new double[count];
    }

    public int Count { get; }

    /// <summary>Classes with a non-zero row of Q_d.</summary>
    public int Contributing => _squares.Count(value => value > ZeroSquares);

    /// <summary>sum_c |Q_dc' Q_rc|² (Frobenius), Q_r the reduced model's orthonormal basis.</summary>
    public double LeverageTrace { get; private set; }

    /// <summary>phi, the share of the score's variance that estimating the reduced model leaves.</summary>
    public double Phi => 1 - (LeverageTrace / _contrast.Rank);

    /// <summary>s_c = sum of the rows of Q_d times the residual under equal effects.</summary>
    internal ReadOnlySpan<double> Score(int code) => Of(_scores, code);

    /// <summary>The same with the contrast's own fitted part in place of the residual.</summary>
    internal ReadOnlySpan<double> FittedScore(int code) => Of(_fitted, code);

    /// <param name="parts">Null: the part has no sums by such classes.</param>
    /// <returns>Null when the products of some part were too many to be kept.</returns>
    public static ContrastSums? Of(EffectContrast contrast, IReadOnlyList<PartClasses?> parts, int count)
    {
        if (parts.Any(part => part?.Sums.Moments is null))
        {
            return null;
        }

        var sums = new ContrastSums(contrast, count);
        var rank = contrast.CommonRank;
        var common = new double[count][];
        for (var k = 0; k < parts.Count; k++)
        {
            var (part, own) = (parts[k]!, new PartOfContrast(contrast, k));
            for (var code = 0; code < part.Sums.Count; code++)
            {
                sums.Take(own, part.Sums, code, part.Codes[code], common[part.Codes[code]] ??= new double[rank * contrast.Rank]);
            }
        }

        sums.LeverageTrace += common.Where(one => one is not null).Sum(one => BlockKernels.Dot(one, one));
        return sums;
    }

    /// <param name="common">Q_dc' diag(Qz) B of the class over all parts so far, column by column.</param>
    private void Take(PartOfContrast part, ClassSums sums, int own, int code, double[] common)
    {
        var moments = sums.Moments!;
        var (squares, cross) = (new double[part.Rank], new double[part.FinalRank]);
        Turn(part, [.. Enumerable.Range(0, part.Rank).Select(a => sums.Score(own)[a] - BlockKernels.Dot(moments.Squares(own, a), part.Common))], _scores, code);
        Turn(part, [.. Enumerable.Range(0, part.Rank).Select(a => BlockKernels.Dot(moments.Squares(own, a), part.Fitted))], _fitted, code);
        for (var t = 0; t < _contrast.Rank; t++)
        {
            squares.AsSpan().Clear();
            cross.AsSpan().Clear();
            for (var a = 0; a < part.Rank; a++)
            {
                BlockKernels.AddScaled(squares, part.Direction(t)[a], moments.Squares(own, a));
                BlockKernels.AddScaled(cross, part.Direction(t)[a], moments.Cross(own, a));
            }

            _squares[code] += BlockKernels.Dot(squares, part.Direction(t));
            LeverageTrace += BlockKernels.Dot(cross, cross);
            _contrast.TurnCommon(part.Place, squares, common.AsSpan(t * _contrast.CommonRank, _contrast.CommonRank));
        }
    }

    private void Turn(PartOfContrast part, double[] inPart, double[] into, int code) => _contrast.Turn(part.Place, inPart, Of(into, code));

    private Span<double> Of(double[] values, int code) => values.AsSpan(code * _contrast.Rank, _contrast.Rank);

    /// <summary>What a contrast is in one part's coordinates.</summary>
    private sealed class PartOfContrast
    {
        private readonly double[][] _directions;

        public PartOfContrast(EffectContrast contrast, int place)
        {
            (Place, Rank, FinalRank) = (place, contrast.Parts[place].Rank, contrast.Parts[place].Final.Rank);
            (Common, Fitted) = (contrast.Common(place), contrast.Fitted(place));
            _directions = [.. Enumerable.Range(0, contrast.Rank).Select(_ => new double[Rank])];
            var (unit, entries) = (new double[Rank], new double[contrast.Rank]);
            for (var a = 0; a < Rank; a++)
            {
                unit.AsSpan().Clear();
                entries.AsSpan().Clear();
                unit[a] = 1;
                contrast.Turn(place, unit, entries);
                for (var t = 0; t < entries.Length; t++)
                {
                    _directions[t][a] = entries[t];
                }
            }
        }

        public int Place { get; }

        public int Rank { get; }

        public int FinalRank { get; }

        public double[] Common { get; }

        public double[] Fitted { get; }

        /// <summary>Column t of L_k.</summary>
        public double[] Direction(int t) => _directions[t];
    }
}
