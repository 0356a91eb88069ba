using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>Sums over the rows of each class of all that belongs to the final model alone, shared by its groups: sum q_F q_F' and sum q_F e(F).</summary>
internal sealed class FinalMoments(RowClasses classes, int rank)
{
    /// <summary>Above this many clusters CR2 and the wild bootstrap are not computed.</summary>
    public const int MostClasses = 5000;

    /// <summary>Doubles that all matrices of all classes may take together (256 MB).</summary>
    private const long MostDoubles = 1L << 25;

    private readonly double[] _squares = new double[classes.Count * rank * rank];
    private readonly double[] _scores = new double[classes.Count * rank];

    public static bool Fit(RowClasses classes, int rank) =>
        classes.Count <= MostClasses && (long)classes.Count * rank * rank <= MostDoubles;

    /// <summary>Row j of sum q_F q_F', r entries.</summary>
    public Span<double> Squares(int code, int j) => _squares.AsSpan(((code * rank) + j) * rank, rank);

    /// <summary>sum q_F e(F), r entries.</summary>
    public Span<double> Scores(int code) => _scores.AsSpan(code * rank, rank);

    public void Add(ResidualBlock block, FinalRows rows)
    {
        for (var i = 0; i < block.Rows; i++)
        {
            var (code, copies) = (classes.Codes[block.FirstRow + i], rows.Alive[i]);
            var row = rows.Row(i);
            BlockKernels.AddScaled(Scores(code), copies * block.Residuals[i], row);
            for (var j = 0; j < rank; j++)
            {
                BlockKernels.AddScaled(Squares(code, j), copies * row[j], row);
            }
        }
    }
}

/// <summary>The rows of Q_F of a block, each in one piece, and how many copies of each count: none of a row with h(F) = 1.</summary>
internal sealed class FinalRows(int capacity, int rank)
{
    private readonly double[] _rows = new double[capacity * rank];
    private readonly double[] _alive = new double[capacity];

    public ReadOnlySpan<double> Alive => _alive;

    public ReadOnlySpan<double> Row(int i) => _rows.AsSpan(i * rank, rank);

    public void Load(ResidualBlock block)
    {
        for (var j = 0; j < rank; j++)
        {
            var column = block.QColumn(j);
            for (var i = 0; i < block.Rows; i++)
            {
                _rows[(i * rank) + j] = column[i];
            }
        }

        for (var i = 0; i < block.Rows; i++)
        {
            _alive[i] = 1 - block.Leverages[i] <= GroupAccumulator.LeverageOne ? 0 : block.Copies?[i] ?? 1;
        }
    }
}
