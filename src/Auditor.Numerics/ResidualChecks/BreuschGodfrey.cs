using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Breusch–Godfrey check of an order k. Null: the errors are not correlated up to k periods apart. n R² of the residuals on the final model's columns and the
/// residuals of 1 to k periods before (0 where there is none); chi-square on the rank these add. Of weighted fits rows times sqrt(w) throughout. Valid also with lags of the response among the
/// terms. One series only: within many short ones, coefficients of the units bias it.
/// </summary>
/// <remarks>Godfrey 1978 and Breusch 1978 (from memory). Verified against R's lmtest, statsmodels and gretl (tests/reference).</remarks>
public static class BreuschGodfrey
{
    public static CheckOutcome Of(SerialFit fit, int order)
    {
        if (fit.SeriesImpediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var group = Group(fit, order);
        if (fit.Fit.Fit.N - group.RankWith <= 0 || group.Rank == 0)
        {
            return CheckOutcome.None(CheckImpediment.TooFew);
        }

        var share = group.SumOfSquares / group.RssWithout;
        return ChiSquaredCheck.Of(fit.Fit.Fit.N * share, group.Rank, new CheckSize(SizeMeasure.AuxiliaryRSquared, share));
    }

    private static AddedGroup Group(SerialFit fit, int order)
    {
        double[][] lags = [.. Enumerable.Range(1, order).Select(k => ByPosition(fit, fit.Lagged(k)))];
        var columns = fit.Fit.Final.Factor.Layout.FinalColumns;
        var layout = new DesignLayout(fit.Fit.Final.Factor.Layout.Intercept, columns, [new ColumnRange(columns, order)]);
        var rows = new DerivedRows(fit.Fit.Design, layout, keepWeights: true, (source, derived) => Fill(fit.Fit, lags, source, derived));
        return AddedGroup.Of(FinalFactor.Of(FactorBuilder.Build(rows)), [.. layout.Groups[0].Indices]);
    }

    private static double[] ByPosition(SerialFit fit, double[] inTime)
    {
        var values = new double[inTime.Length];
        for (var at = 0; at < values.Length; at++)
        {
            values[fit.Order.Positions[at]] = inTime[at];
        }

        return values;
    }

    /// <summary>Residuals carry sqrt(w) already, and rows get it once more.</summary>
    private static void Fill(CheckedFit fit, double[][] lags, RowBlock source, RowBlock derived)
    {
        var columns = fit.Final.Factor.Layout.FinalColumns;
        for (var c = 0; c < columns; c++)
        {
            source.Column(c).CopyTo(derived.Column(c));
        }

        for (var i = 0; i < derived.Rows; i++)
        {
            var root = Math.Sqrt(source.Weights?[i] ?? 1);
            for (var k = 0; k < lags.Length; k++)
            {
                derived.Column(columns + k)[i] = lags[k][derived.FirstRow + i] / root;
            }

            derived.Column(derived.Columns - 1)[i] = fit.Store.Residuals[derived.FirstRow + i] / root;
        }
    }
}
