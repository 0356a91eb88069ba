namespace Auditor.Numerics.Factor;

/// <summary>
/// One corrected semi-normal step for the final model's coefficients: residuals r = y - X b and X'Wr in double-double on the data as declared, then
/// R'R d = X'Wr and b + d. The size of d says how many digits the plain coefficients had: that many survive a change in the last bit of
/// the data.
/// </summary>
/// <remarks>
/// Corrected semi-normal equations: Björck 1987, Linear Algebra and its Applications 88/89 (from memory). Checked against certified values of NIST StRD.
/// </remarks>
internal sealed class Refinement
{
    private readonly FinalFactor _final;
    private readonly bool _intercept;
    private readonly DoubleDouble[] _coefficients;
    private readonly DoubleDouble[] _gradient;
    private readonly DoubleDoubleColumn _residual = new();
    private readonly DoubleDoubleColumn _weighted = new();
    private DoubleDouble _sumOfResiduals;
    private DoubleDouble _sumOfSquares;

    public Refinement(FinalFactor final)
    {
        _final = final;
        _intercept = final.Factor.Layout.Intercept;
        _coefficients = StartingCoefficients();
        _gradient = new DoubleDouble[final.Rank];
    }

    /// <summary>Residuals y - X b of the rows of the block last added, not weighted.</summary>
    public ReadOnlySpan<double> Residuals => _residual.High;

    public void Add(RowBlock block)
    {
        ComputeResiduals(block);
        var weighted = Weighted(block);
        for (var k = 0; k < _final.Rank; k++)
        {
            _gradient[k] += weighted.Dot(block.Column(_final.Kept[k]));
        }

        _sumOfResiduals += weighted.Sum();
        _sumOfSquares += weighted.Dot(_residual);
    }

    public RefinedCoefficients Finish()
    {
        var gradient = ShiftedGradient();
        var step = (double[])gradient.Clone();
        Triangle.SolveTransposed(_final.Triangle, step);
        Triangle.Solve(_final.Triangle, step);
        var gain = BlockKernels.Dot(step, gradient);
        var declared = DeclaredScale(step);
        return new RefinedCoefficients(
            [.. _coefficients.Zip(declared, (start, change) => (start + DoubleDouble.Of(change)).Value)],
            declared,
            Math.Max(0, (_sumOfSquares - DoubleDouble.Of(gain)).Value));
    }

    /// <summary>R b = Q'y, then the constant moved from the shifted columns to the declared ones.</summary>
    private DoubleDouble[] StartingCoefficients()
    {
        var slopes = _final.Explained(_final.Factor.Layout.Response).ToArray();
        Triangle.Solve(_final.Triangle, slopes);
        var start = slopes.Select(DoubleDouble.Of).ToArray();
        if (_intercept)
        {
            start[0] += DoubleDouble.Of(_final.Factor.Shifts[_final.Factor.Layout.Response]);
            start[0] -= ShiftsTimes(slopes);
        }

        return start;
    }

    private double[] DeclaredScale(double[] step)
    {
        var declared = (double[])step.Clone();
        if (_intercept)
        {
            declared[0] = (DoubleDouble.Of(step[0]) - ShiftsTimes(step)).Value;
        }

        return declared;
    }

    private DoubleDouble ShiftsTimes(double[] slopes)
    {
        var total = DoubleDouble.Of(0);
        for (var k = 1; k < slopes.Length; k++)
        {
            total += DoubleDouble.Of(_final.Factor.Shifts[_final.Kept[k]]) * slopes[k];
        }

        return total;
    }

    private void ComputeResiduals(RowBlock block)
    {
        _residual.Load(block.Column(_final.Factor.Layout.Response));
        for (var k = 0; k < _final.Rank; k++)
        {
            DoubleDoubleKernels.SubtractScaled(_residual.High, _residual.Low, block.Column(_final.Kept[k]), _coefficients[k]);
        }

        _residual.Renormalise();
    }

    private DoubleDoubleColumn Weighted(RowBlock block)
    {
        if (block.Weights is null && block.Copies is null)
        {
            return _residual;
        }

        _weighted.Load(_residual.High);
        for (var i = 0; i < block.Rows; i++)
        {
            _weighted[i] = _residual[i] * (block.Weights?[i] ?? 1) * (block.Copies?[i] ?? 1);
        }

        return _weighted;
    }

    /// <summary>X'Wr for the shifted columns that R belongs to: (x - s)'Wr = x'Wr - s 1'Wr, exactly.</summary>
    private double[] ShiftedGradient() =>
        [.. _gradient.Select((value, k) => (value - (_sumOfResiduals * _final.Factor.Shifts[_final.Kept[k]])).Value)];
}

/// <param name="Values">Coefficients of the kept columns, for columns as declared; r of them.</param>
/// <param name="Steps">What the refinement changed in each.</param>
/// <param name="Rss">Residual sum of squares from double-double residuals.</param>
public sealed record RefinedCoefficients(IReadOnlyList<double> Values, IReadOnlyList<double> Steps, double Rss);
