using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>A fit with the residuals of all its rows, ready to be checked.</summary>
/// <param name="Design">The rows that the fit was made on; read again by the checks that need columns.</param>
/// <param name="Sampling">The weights are sampling weights.</param>
public sealed record CheckedFit(IDesignRows Design, FinalFactor Final, Fit Fit, ResidualStore Store, bool Sampling)
{
    /// <summary>Kept columns beside the intercept.</summary>
    internal int[] Slopes => [.. Final.Kept.Where(column => !(Final.Factor.Layout.Intercept && column == 0))];

    /// <summary>Why no check at all can be made, or null.</summary>
    internal CheckImpediment? Impediment =>
        Sampling ? CheckImpediment.SamplingWeights
        : Fit.Perfect || Fit.ResidualDf <= 0 || Fit.Rss <= 0 ? CheckImpediment.NoResiduals
        : !Store.Vary ? CheckImpediment.ResidualsDoNotVary
        : null;
}
