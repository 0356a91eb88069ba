using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Breusch–Pagan check. Null: the error variance does not depend on the final model's columns. Squared residuals (of weighted fits sqrt(w) e, squared) are regressed on an
/// intercept and the final model's kept columns, unweighted; df = rank - 1. Studentised (Koenker): n R², chi-square, any error distribution.
/// Original: half the explained sum of squares of e² / (RSS/n), chi-square under normal errors.
/// </summary>
/// <remarks>
/// Breusch and Pagan 1979, Econometrica 47; Koenker 1981, Journal of Econometrics 17. Verified against R's lmtest, numpy and published values (tests/reference).
/// </remarks>
public static class BreuschPagan
{
    public static CheckOutcome Studentised(CheckedFit fit) => Check(fit, auxiliary => auxiliary.N * auxiliary.RSquared);

    public static CheckOutcome Original(CheckedFit fit) => Check(fit, auxiliary => auxiliary.Explained / 2);

    private static CheckOutcome Check(CheckedFit fit, Func<AuxiliaryRegression, double> statistic)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var slopes = fit.Slopes;
        var variance = fit.Fit.Rss / fit.Fit.N;
        var auxiliary = AuxiliaryRegression.Of(fit.Design, slopes.Length, (source, derived) => Fill(fit.Store, slopes, variance, source, derived));
        if (auxiliary.Df == 0)
        {
            return CheckOutcome.None(CheckImpediment.NothingToRelate);
        }

        var value = statistic(auxiliary);
        return ChiSquaredCheck.Of(value, auxiliary.Df);
    }

    private static void Fill(ResidualStore store, int[] slopes, double variance, RowBlock source, RowBlock derived)
    {
        for (var k = 0; k < slopes.Length; k++)
        {
            source.Column(slopes[k]).CopyTo(derived.Column(k + 1));
        }

        SquaredResiduals.Fill(store, variance, derived);
    }
}

/// <summary>The response of the variance checks.</summary>
internal static class SquaredResiduals
{
    /// <summary>e² / variance into the last column.</summary>
    public static void Fill(ResidualStore store, double variance, RowBlock derived)
    {
        var response = derived.Column(derived.Columns - 1);
        for (var i = 0; i < response.Length; i++)
        {
            var e = store.Residuals[derived.FirstRow + i];
            response[i] = e * e / variance;
        }
    }
}
