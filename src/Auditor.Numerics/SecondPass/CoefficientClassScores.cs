using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>
/// Sums of q_i e_i (r entries, q_i a row of the orthonormal Q_F) by cluster or period, each row as often as it has copies: what covariances of the final model's own coefficients over
/// classes are made of. They serve to reproduce what an author printed.
/// </summary>
public sealed class CoefficientClassScores : IAccumulator
{
    /// <summary>Doubles that the sums may take (256 MB).</summary>
    private const long MostDoubles = 1L << 25;

    private readonly RowClasses _classes;
    private readonly double[] _scores;

    private CoefficientClassScores(FinalFactor final, RowClasses classes)
    {
        (Final, _classes) = (final, classes);
        _scores = new double[classes.Count * final.Rank];
    }

    public int Count => _classes.Count;

    internal FinalFactor Final { get; }

    /// <returns>Null when the sums do not fit.</returns>
    public static CoefficientClassScores? Of(FinalFactor final, RowClasses classes) =>
        (long)classes.Count * final.Rank <= MostDoubles ? new CoefficientClassScores(final, classes) : null;

    /// <summary>The sum of one class; periods in the order of time.</summary>
    internal ReadOnlySpan<double> Score(int code) => _scores.AsSpan(code * Final.Rank, Final.Rank);

    public void Add(ResidualBlock block)
    {
        for (var k = 0; k < Final.Rank; k++)
        {
            var column = block.QColumn(k);
            for (var i = 0; i < block.Rows; i++)
            {
                _scores[(_classes.Codes[block.FirstRow + i] * Final.Rank) + k] += (block.Copies?[i] ?? 1) * block.Residuals[i] * column[i];
            }
        }
    }
}
