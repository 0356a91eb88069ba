namespace Auditor.Numerics.ResidualChecks;

/// <summary>A fit whose rows have an order in time, with its residuals sqrt(w) e in that order.</summary>
/// <param name="laggedResponse">Whether a lag of the response stands among the terms.</param>
public sealed class SerialFit(CheckedFit fit, SerialOrder order, bool laggedResponse)
{
    private readonly Lazy<double[]> _residuals = new(() => order.Arrange(fit.Store.Residuals.ToArray()));

    public CheckedFit Fit { get; } = fit;

    public SerialOrder Order { get; } = order;

    internal double[] Residuals => _residuals.Value;

    internal CheckImpediment? LaggedResponse => laggedResponse ? CheckImpediment.LaggedResponse : null;

    /// <summary>Why no check of the order can be made, or null.</summary>
    internal CheckImpediment? Impediment =>
        Fit.Impediment is { } why ? why
        : Fit.Store.Copies is { } all && all.Any(copies => copies != 1) ? CheckImpediment.FrequencyWeights
        : Fit.Store.Spread * Math.Sqrt(Fit.Fit.N) <= Fit.Noise ? CheckImpediment.EqualResiduals
        : null;

    /// <summary>Why no check that is defined for one series can be made, or null.</summary>
    internal CheckImpediment? SeriesImpediment => Impediment ?? (Order.Units > 1 ? CheckImpediment.SeveralSeries : null);

    /// <summary>The residual of that many periods before, in time order; 0 where there is none.</summary>
    internal double[] Lagged(int periods) => [.. Order.Lag(periods).Select(at => at < 0 ? 0 : Residuals[at])];
}
