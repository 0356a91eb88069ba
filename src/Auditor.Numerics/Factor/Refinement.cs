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
    private readonly double[] _plain;
    private readonly bool[] _hasLowParts;
    private readonly DoubleDouble[] _gradient;
    private readonly DoubleDoubleColumn _residual = new();
    private readonly DoubleDoubleColumn _weighted = new();
    private DoubleDouble _sumOfResiduals;
    private DoubleDouble _sumOfSquares;

    public Refinement(FinalFactor final)
    {
        _final = final;
        _intercept = final.Factor.Layout.Intercept;
        _coefficients = InDeclaredColumns(final.Slopes());
        _plain = PlainCoefficients();
        _hasLowParts = new bool[final.Rank];
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
            if (block.Low is not null)
            {
                _hasLowParts[k] |= block.LowColumn(_final.Kept[k]).ContainsAnyExcept(0.0);
                _gradient[k] += DoubleDouble.Of(BlockKernels.Dot(weighted.High, block.LowColumn(_final.Kept[k])));
            }
        }

        _sumOfResiduals += weighted.Sum();
        _sumOfSquares += weighted.Dot(_residual);
    }

    /// <summary>Takes in the sums over the rows that follow.</summary>
    public void Merge(Refinement next)
    {
        for (var k = 0; k < _gradient.Length; k++)
        {
            _gradient[k] += next._gradient[k];
            _hasLowParts[k] |= next._hasLowParts[k];
        }

        _sumOfResiduals += next._sumOfResiduals;
        _sumOfSquares += next._sumOfSquares;
    }

    public RefinedCoefficients Finish()
    {
        var gradient = ShiftedGradient();
        var step = Step(gradient);
        var gain = BlockKernels.Dot(step, gradient);
        var declared = DeclaredScale(step);
        double[] values = [.. _coefficients.Zip(declared, (start, change) => (start + DoubleDouble.Of(change)).Value)];
        return new RefinedCoefficients(
            values,
            _final.Factor.IsExtended && !CostlyColumnsAreFormedHere() ? [.. values.Zip(_plain, (value, plain) => value - plain)] : declared,
            Math.Max(0, (_sumOfSquares - DoubleDouble.Of(gain)).Value));
    }

    /// <summary>The constant moved from the shifted columns to the declared ones.</summary>
    private DoubleDouble[] InDeclaredColumns(DoubleDouble[] slopes)
    {
        var declared = (DoubleDouble[])slopes.Clone();
        if (_intercept)
        {
            declared[0] += DoubleDouble.Of(_final.Factor.Shifts[_final.Factor.Layout.Response]);
            for (var k = 1; k < slopes.Length; k++)
            {
                declared[0] -= slopes[k] * _final.Factor.Shifts[_final.Kept[k]];
            }
        }

        return declared;
    }

    /// <summary>What the rounded factor alone gives.</summary>
    private double[] PlainCoefficients()
    {
        var slopes = _final.Explained(_final.Factor.Layout.Response).ToArray();
        Triangle.Solve(_final.Triangle, slopes);
        return [.. InDeclaredColumns([.. slopes.Select(DoubleDouble.Of)]).Select(value => value.Value)];
    }

    /// <summary>
    /// Every column that costs digits was formed in extended precision, so that a change in the last bit of the data does not move it alone. Otherwise the digits
    /// are those of the rounded factor, although the coefficients are those of the data as they stand.
    /// </summary>
    private bool CostlyColumnsAreFormedHere() =>
        Enumerable.Range(0, _final.Rank).All(k => _hasLowParts[k] || !PreciseFactor.IsCostly(_final.Factor, _final.Kept[k]));

    /// <summary>d with R'R d = gradient.</summary>
    private double[] Step(double[] gradient)
    {
        if (_final.PreciseTriangle is not { } precise)
        {
            var step = (double[])gradient.Clone();
            Triangle.SolveTransposed(_final.Triangle, step);
            Triangle.Solve(_final.Triangle, step);
            return step;
        }

        DoubleDouble[] exact = [.. gradient.Select(DoubleDouble.Of)];
        precise.SolveTransposed(exact);
        precise.Solve(exact);
        return [.. exact.Select(value => value.Value)];
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
            if (block.Low is not null)
            {
                BlockKernels.AddScaled(_residual.Low, -_coefficients[k].High, block.LowColumn(_final.Kept[k]));
            }
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
