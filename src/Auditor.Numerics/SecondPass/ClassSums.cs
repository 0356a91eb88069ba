using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>
/// Sums of one group by cluster, unit or period (C classes), in the coordinates of its orthonormal Qz. Rows with h(F) = 1 have qz = 0 and e = 0
/// and are left out; a row counts as often as it has copies.
/// </summary>
public sealed class ClassSums
{
    /// <summary>A sum of squared rows of Qz below this is rounding.</summary>
    private const double ZeroSquares = 1e-24;

    private readonly AddedGroup _group;
    private readonly double[] _scores;
    private readonly double[] _residualScores;
    private readonly double[] _fittedScores;
    private readonly double[] _squares;
    private readonly double[] _sumSquares;

    internal ClassSums(RowClasses classes, AddedGroup group)
    {
        _group = group;
        Count = classes.Count;
        _scores = new double[Count * group.Rank];
        _residualScores = new double[Count * group.Rank];
        _fittedScores = new double[Count * group.Rank];
        _squares = new double[Count];
        _sumSquares = new double[Count];
    }

    /// <summary>Number of classes.</summary>
    public int Count { get; }

    /// <summary>Classes with a non-zero row of qz.</summary>
    public int Contributing { get; private set; }

    /// <summary>sum_c |Qz_c' Q_Fc|² (Frobenius), the trace of N in phi.</summary>
    public double LeverageTrace { get; private set; }

    /// <summary>Each class's sums of all products; null when they were too many to be kept.</summary>
    internal ClassMoments? Moments { get; private set; }

    /// <summary>The same of the final model's own rows; null likewise.</summary>
    internal FinalMoments? Final { get; init; }

    /// <summary>s_c = sum of qz e(F) over the class, q entries: the null-imposed score.</summary>
    internal ReadOnlySpan<double> Score(int code) => Of(_scores, code);

    /// <summary>sum of qz e(F+g): the score that an unrestricted covariance is made of.</summary>
    internal ReadOnlySpan<double> ResidualScore(int code) => Of(_residualScores, code);

    /// <summary>sum of qz times the group's own fitted part: what the score would be without any error.</summary>
    internal ReadOnlySpan<double> FittedScore(int code) => Of(_fittedScores, code);

    /// <summary>sum of |qz|² over the class; all classes add up to q.</summary>
    internal double Squares(int code) => _squares[code];

    /// <summary>|sum of qz|² over the class.</summary>
    internal double SumSquares(int code) => _sumSquares[code];

    internal void Take(ClassWindow window, ClassMoments moments)
    {
        foreach (var (place, code) in window.Held)
        {
            TakeClass(moments, place, code);
        }

        Moments = window.HoldsAll ? moments : null;
    }

    private void TakeClass(ClassMoments moments, int place, int code)
    {
        moments.Scores(place).CopyTo(Of(_scores, code));
        _sumSquares[code] = BlockKernels.Dot(moments.Sums(place), moments.Sums(place));
        var u = ((double[])[.. _group.U]).AsSpan();
        for (var a = 0; a < _group.Rank; a++)
        {
            var fitted = BlockKernels.Dot(moments.Squares(place, a), u);
            Of(_fittedScores, code)[a] = fitted;
            Of(_residualScores, code)[a] = Score(code)[a] - fitted;
            _squares[code] += moments.Squares(place, a)[a];
            LeverageTrace += BlockKernels.Dot(moments.Cross(place, a), moments.Cross(place, a));
        }

        Contributing += _squares[code] > ZeroSquares ? 1 : 0;
    }

    private Span<double> Of(double[] values, int code) => values.AsSpan(code * _group.Rank, _group.Rank);
}
