namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Ljung–Box check of the first k autocorrelations. Null: the errors are not correlated up to k periods apart. n (n + 2) sum r_j² / m_j, r_j the sum of products of residuals j
/// periods apart over the sum of squares, both about the mean, m_j the number of such pairs (n - j without gaps); of weighted fits sqrt(w) e. Chi-square on k: no degrees
/// of freedom are taken off. Not with a lag of the response among the terms; one series only.
/// </summary>
/// <remarks>Ljung and Box 1978, Biometrika 65. Verified against R's Box.test and statsmodels (tests/reference).</remarks>
public static class LjungBox
{
    public static CheckOutcome Of(SerialFit fit, int lags)
    {
        if ((fit.SeriesImpediment ?? fit.LaggedResponse) is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        Autocorrelation[] correlations = [.. Enumerable.Range(1, lags).Select(lag => Autocorrelation.At(fit, lag))];
        if (correlations.Any(correlation => correlation.Pairs == 0))
        {
            return CheckOutcome.None(CheckImpediment.TooFew);
        }

        var n = fit.Residuals.Length;
        var statistic = n * (n + 2.0) * correlations.Sum(correlation => correlation.Value * correlation.Value / correlation.Pairs);
        return ChiSquaredCheck.Of(statistic, lags, new CheckSize(SizeMeasure.LargestAutocorrelation, correlations.Select(correlation => correlation.Value).MaxBy(Math.Abs)));
    }
}
