namespace Auditor.Numerics.Factor;

/// <summary>
/// The upper-trapezoidal factor R of the prepared design [F Z_1 … Z_G y] (n rows, P columns): every nested model on this row set is a
/// small problem on R, whatever n is. Nothing is dropped here; rank is decided for each submodel.
/// </summary>
/// <remarks>
/// Householder reflections by row blocks: backward stable column by column (Higham 2002, Accuracy and Stability of Numerical
/// Algorithms, 2nd ed., chapter 19; from memory). Checked against certified values of NIST StRD in the tests.
/// </remarks>
public sealed class OrthogonalFactor
{
    internal OrthogonalFactor(DesignLayout layout, ColumnMatrix r, double[] shifts, double[] largest, RowTotals totals, DoubleDoubleMatrix? precise = null)
    {
        Precise = precise;
        Layout = layout;
        R = r;
        Shifts = shifts;
        LargestValues = largest;
        Totals = totals;
        Lengths = [.. Enumerable.Range(0, r.Columns).Select(CentredLength)];
    }

    /// <summary>A design must hold smaller values than this: the squares of larger ones could overflow.</summary>
    public const double LargestValue = 1e100;

    public DesignLayout Layout { get; }

    /// <summary>P columns, zero below the diagonal; P rows, with fewer observations than columns about as many as there are observations.</summary>
    public ColumnMatrix R { get; }

    /// <summary>R in double-double where the columns cost so many digits that it was worth it (<see cref="PreciseFactor"/>); else null.</summary>
    internal DoubleDoubleMatrix? Precise { get; }

    /// <summary>The factor was made in extended precision.</summary>
    public bool IsExtended => Precise is not null;

    /// <summary>What was subtracted from each column before factoring; zeros without an intercept.</summary>
    public IReadOnlyList<double> Shifts { get; }

    /// <summary>Largest absolute value of each column as declared: rounding is relative to it.</summary>
    public IReadOnlyList<double> LargestValues { get; }

    public RowTotals Totals { get; }

    /// <summary>Length of each column after the intercept is taken out (plain length without one; the intercept's own length for itself).</summary>
    public IReadOnlyList<double> Lengths { get; }

    private double CentredLength(int column)
    {
        var values = R.Column(column);
        var centred = Layout.Intercept && column > 0 ? values[1..] : values;
        return Math.Sqrt(BlockKernels.Dot(centred, centred));
    }
}

/// <summary>Totals over the rows of a row set.</summary>
/// <param name="Rows">Rows of the source.</param>
/// <param name="N">Number of observations: rows, or the sum of copies.</param>
/// <param name="SumOfWeights">Sum of w times copies.</param>
/// <param name="SumOfLogWeights">Sum of log w.</param>
public sealed record RowTotals(int Rows, double N, double SumOfWeights, double SumOfLogWeights);
