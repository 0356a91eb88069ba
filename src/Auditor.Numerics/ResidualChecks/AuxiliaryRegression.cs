using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// The auxiliary regression of a variance check, with an intercept, rows not weighted: n observations, rank r. The response is e² / (RSS/n), for weighted fits
/// with sqrt(w) e in place of e.
/// </summary>
/// <param name="Df">r - 1.</param>
/// <param name="Explained">Explained sum of squares about the mean.</param>
/// <param name="Total">Sum of squares of the response about its mean.</param>
/// <param name="Impediment">Why the check has no value; null when it has one.</param>
internal sealed record AuxiliaryRegression(double N, int Df, double Explained, double Total, CheckImpediment? Impediment)
{
    public double RSquared => Explained / Total;

    /// <param name="fit">Its residuals make the response.</param>
    /// <param name="columns">Columns beside the intercept.</param>
    /// <param name="fill">Fills columns 1 to that number of the derived block from the block of the fit's design.</param>
    public static AuxiliaryRegression OfSquares(CheckedFit fit, int columns, Action<RowBlock, RowBlock> fill)
    {
        var variance = fit.Fit.Rss / fit.Fit.N;
        var rows = new DerivedRows(fit.Design, new DesignLayout(true, columns + 1, []), keepWeights: false, (source, derived) =>
        {
            fill(source, derived);
            FillSquares(fit.Store, variance, derived);
        });
        var final = FinalFactor.Of(FactorBuilder.Build(rows, fit.Threads));
        var explained = final.Explained(final.Factor.Layout.Response)[1..];
        var sum = BlockKernels.Dot(explained, explained);
        return new AuxiliaryRegression(final.Factor.Totals.N, final.Rank - 1, sum, sum + final.Rss, ImpedimentOf(fit, final, sum + final.Rss));
    }

    /// <summary>The check of n R², chi-square on r - 1.</summary>
    public CheckOutcome Studentised() => Check(N * RSquared);

    /// <summary>A check of that value, chi-square on r - 1.</summary>
    public CheckOutcome Check(double statistic) =>
        Impediment is { } impediment ? CheckOutcome.None(impediment) : ChiSquaredCheck.Of(statistic, Df, new CheckSize(SizeMeasure.AuxiliaryRSquared, RSquared));

    /// <remarks>
    /// Residuals carry rounding of a length of at most the noise, so squares of equal residuals, in units of the variance, one of at most twice noise / (RSS/n)^½.
    /// </remarks>
    private static CheckImpediment? ImpedimentOf(CheckedFit fit, FinalFactor final, double total) =>
        final.Rank == 1 ? CheckImpediment.NothingToRelate
        : final.Factor.Totals.N <= final.Rank ? CheckImpediment.Saturated
        : Math.Sqrt(total) <= 2 * fit.Noise / Math.Sqrt(fit.Fit.Rss / fit.Fit.N) ? CheckImpediment.EqualSquares
        : null;

    private static void FillSquares(ResidualStore store, double variance, RowBlock derived)
    {
        var response = derived.Column(derived.Columns - 1);
        store.Residuals.Read(derived.FirstRow, response);
        foreach (ref var e in response)
        {
            e = e * e / variance;
        }
    }
}
