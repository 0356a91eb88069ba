using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>
/// Sums over the rows of each class of a window, for one group: with q_F a row of Q_F (r entries) and qz one of Qz (q entries), each row as
/// often as it has copies.
/// </summary>
internal sealed class ClassMoments(ClassWindow window, AddedGroup group)
{
    private readonly int _q = group.Rank;
    private readonly int _r = group.Final.Rank;
    private readonly double[] _row = new double[group.Rank];
    private readonly double[] _cross = new double[window.Size * group.Rank * group.Final.Rank];
    private readonly double[] _squares = new double[window.Size * group.Rank * group.Rank];
    private readonly double[] _scores = new double[window.Size * group.Rank];
    private readonly double[] _sums = new double[window.Size * group.Rank];

    /// <summary>Doubles that one class takes.</summary>
    public static long Size(AddedGroup group) => (long)group.Rank * (group.Final.Rank + group.Rank + 2);

    /// <summary>Row a of sum qz q_F', r entries.</summary>
    public Span<double> Cross(int place, int a) => _cross.AsSpan(((place * _q) + a) * _r, _r);

    /// <summary>Row a of sum qz qz', q entries.</summary>
    public Span<double> Squares(int place, int a) => _squares.AsSpan(((place * _q) + a) * _q, _q);

    /// <summary>sum qz e(F), q entries.</summary>
    public Span<double> Scores(int place) => _scores.AsSpan(place * _q, _q);

    /// <summary>sum qz, q entries.</summary>
    public Span<double> Sums(int place) => _sums.AsSpan(place * _q, _q);

    public void Clear()
    {
        Array.Clear(_cross);
        Array.Clear(_squares);
        Array.Clear(_scores);
        Array.Clear(_sums);
    }

    public void Add(ResidualBlock block, FinalRows final, GroupRows rows)
    {
        for (var i = 0; i < block.Rows; i++)
        {
            if (window.Place(block.FirstRow + i) is int place && final.Alive[i] > 0)
            {
                Gather(rows, i);
                AddRow(place, final.Alive[i], block.Residuals[i], final.Row(i));
            }
        }
    }

    private void Gather(GroupRows rows, int i)
    {
        for (var a = 0; a < _q; a++)
        {
            _row[a] = rows.Column(a)[i];
        }
    }

    private void AddRow(int place, double copies, double residual, ReadOnlySpan<double> final)
    {
        BlockKernels.AddScaled(Scores(place), copies * residual, _row);
        BlockKernels.AddScaled(Sums(place), copies, _row);
        for (var a = 0; a < _q; a++)
        {
            BlockKernels.AddScaled(Cross(place, a), copies * _row[a], final);
            BlockKernels.AddScaled(Squares(place, a), copies * _row[a], _row);
        }
    }
}
