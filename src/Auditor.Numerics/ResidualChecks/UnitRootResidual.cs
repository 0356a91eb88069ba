using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Which functions of time the final model holds beside columns that may drift.</summary>
public enum Deterministic
{
    None,
    Constant,
    Trend,
    QuadraticTrend,
}

/// <summary>
/// Unit root of the residual. Null: the residual drifts (has a unit root), so that the final model relates series that only seem to move together; rejecting is the good
/// outcome. Statistic: t of the augmented Dickey–Fuller regression on the n residuals in time order, lags by AIC. p = Phi of the quadratic through the three points (critical value, normal quantile of its level)
/// at 1, 5 and 10 percent for n - 1 observations and as many series as may drift. That keeps p right in short series, where the p functions published for long ones are too small by up to eight times (25 to 90
/// rows, simulated: this p within 7 percent of itself from 0.0004 up); for long ones it is within 7 percent of theirs from 0.0001 to 0.15 and within 0.04 above. Left of the
/// quadratic's turning point p is only known to be smaller. One series without gaps, at least 20 rows, a model with an intercept, at most 11 columns that may drift.
/// </summary>
/// <remarks>
/// Engle and Granger 1987, Econometrica 55; critical values MacKinnon 2010; the quadratic is the form of MacKinnon 1994, Journal of Business and Economic Statistics 12, fitted here to the
/// values of the sample's own size. Statistic and lags verified against statsmodels' coint, p against its
/// mackinnonp for large n and against simulation for small n (ResidualChecks/values of the tests). The fewest rows are those of MacKinnon's own simulations (from memory).
/// </remarks>
public static class UnitRootResidual
{
    private const int Fewest = 20;
    private static readonly double[] Levels = [0.01, 0.05, 0.10];

    /// <param name="drifting">Columns of the final model that are no function of time alone.</param>
    public static CheckOutcome Of(SerialFit fit, Deterministic part, int drifting)
    {
        if (Impediment(fit, part, drifting) is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var test = DickeyFuller.Of(fit.Residuals);
        return test.T is not double t ? CheckOutcome.None(CheckImpediment.NoResiduals) : Check(t, P(t, part, drifting + 1, fit.Residuals.Length - 1)) with
        {
            Lags = test.Lags,
            Sizes = [new(SizeMeasure.Persistence, test.Persistence)],
        };
    }

    /// <summary>The normal quantile of p, and whether p is only a bound.</summary>
    /// <param name="t">The statistic.</param>
    /// <param name="series">The response and the columns that may drift, 1 to 12.</param>
    public static (double Z, bool Bound) P(double t, Deterministic part, int series, double observations)
    {
        var x = CointegrationCriticalValues.Of(part, series, observations);
        double[] z = [.. Levels.Select(StandardNormal.Quantile)];
        var (low, high) = ((z[1] - z[0]) / (x[1] - x[0]), (z[2] - z[1]) / (x[2] - x[1]));
        var bend = (high - low) / (x[2] - x[0]);
        double At(double value) => z[0] + (low * (value - x[0])) + (bend * (value - x[0]) * (value - x[1]));
        var turn = bend > 0 ? ((x[0] + x[1]) / 2) - (low / (2 * bend)) : double.NegativeInfinity;
        return (At(Math.Max(t, turn)), t < turn);
    }

    private static CheckStatistic Check(double t, (double Z, bool Bound) p) => new(t, null, null, StandardNormal.UpperTail(-p.Z))
    {
        LogP = p.Z < 0 ? StandardNormal.LogUpperTail(-p.Z) : null,
        PIsUpperBound = p.Bound,
    };

    private static CheckImpediment? Impediment(SerialFit fit, Deterministic part, int drifting) =>
        fit.SeriesImpediment is { } why ? why
        : fit.Order.Gaps > 0 ? CheckImpediment.Gaps
        : fit.Residuals.Length < Fewest ? CheckImpediment.TooFew
        : part == Deterministic.None || drifting + 1 > CointegrationCriticalValues.MostSeries ? CheckImpediment.NoCriticalValues
        : null;
}
