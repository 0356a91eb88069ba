using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>A fit with the residuals of all its rows, ready to be checked. What several checks need is computed once, when the first asks.</summary>
/// <param name="design">The rows that the fit was made on, with no groups; read again by the checks that need columns.</param>
/// <param name="sampling">The weights are sampling weights.</param>
/// <param name="threads">Most threads to use; no result depends on it.</param>
public sealed class CheckedFit(IDesignRows design, FinalFactor final, Fit fit, ResidualStore store, bool sampling, int threads = 1)
{
    private readonly Lazy<FittedRange> _fittedRange = new(() => FittedRange.Of(design, fit));
    private double[]? _ordered;
    private AuxiliaryRegression? _linear;

    public IDesignRows Design { get; } = design;

    public FinalFactor Final { get; } = final;

    public Fit Fit { get; } = fit;

    public ResidualStore Store { get; } = store;

    internal int Threads { get; } = threads;

    /// <summary>Kept columns beside the intercept.</summary>
    internal int[] Slopes => [.. Final.Kept.Where(column => !(Final.Factor.Layout.Intercept && column == 0))];

    /// <summary>Why no check at all can be made, or null.</summary>
    internal CheckImpediment? Impediment =>
        sampling ? CheckImpediment.SamplingWeights
        : Fit.Perfect || Fit.ResidualDf <= 0 || Fit.Rss <= 0 ? CheckImpediment.NoResiduals
        : null;

    /// <summary>Length below which the residuals of a fit on these rows are rounding.</summary>
    internal double Noise => PerfectFit.Noise(Final);

    internal FittedRange FittedRange => _fittedRange.Value;

    /// <summary>The fitted value is the same in every row, but for rounding.</summary>
    internal bool FittedIsConstant => FittedRange.HalfWidth * Math.Sqrt(Fit.N) <= Noise;

    /// <summary>Every observation's residual, rising.</summary>
    internal double[] Ordered => _ordered ??= Rising(Store.Expanded());

    /// <summary>Squared residuals on the intercept and the final model's columns.</summary>
    internal AuxiliaryRegression Linear => _linear ??= AuxiliaryRegression.OfSquares(this, Slopes.Length, CopySlopes);

    /// <summary>Why a check of the shape of the residuals' distribution cannot be made, or null.</summary>
    /// <param name="fewest">The fewest observations it is defined for.</param>
    /// <param name="most">The most.</param>
    internal CheckImpediment? ShapeImpediment(double fewest, double most) =>
        Impediment ?? (Fit.N < fewest ? CheckImpediment.TooFew
            : Fit.N > most ? CheckImpediment.TooMany
            : Store.Spread * Math.Sqrt(Fit.N) <= Noise ? CheckImpediment.EqualResiduals
            : null);

    private static double[] Rising(double[] values)
    {
        RisingOrder.Sort(values);
        return values;
    }

    private void CopySlopes(RowBlock source, RowBlock derived)
    {
        var slopes = Slopes;
        for (var k = 0; k < slopes.Length; k++)
        {
            source.Column(slopes[k]).CopyTo(derived.Column(k + 1));
        }
    }
}
