using Auditor.Data;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The points of the residual pictures of the final model.</summary>
internal static class PlotFigures
{
    private const int Named = 3;

    /// <summary>Beyond this, differences and squares of coordinates would overflow.</summary>
    private const double Largest = 1e150;

    /// <param name="influence">The rows that bear most on the fit, which are drawn whatever the number of rows.</param>
    /// <param name="label">The declared row label; null when there is none.</param>
    /// <param name="weighted">The fit has weights that are no counts.</param>
    public static PlotData Of(CheckedFit fit, InfluenceSummary influence, RowSubset rows, DataColumn? label, bool weighted)
    {
        var drawn = DrawnRows.Of(fit.Store.Count, influence);
        RowInfluence[] all = [.. RowInfluence.Of(fit, drawn.Positions)];
        RowInfluence[] studentised = [.. all.Where(row => row.StudentisedResidual is not null)];
        if (studentised.Length == 0)
        {
            return new PlotData(null, "the final model leaves no residuals: it fits to rounding, or no degrees of freedom are left");
        }

        var fitted = FittedValues.Of(fit, drawn.Positions);
        return fitted.Concat(all.Select(row => fit.Store.Residuals[row.Position])).All(value => Math.Abs(value) < Largest)
            ? new PlotData(Plots(fit, all, studentised, fitted, weighted, drawn) with { Named = MostInfluential(studentised, rows, label) }, null)
            : new PlotData(null, "the response's numbers are too large to draw");
    }

    private static ResidualPlots Plots(CheckedFit fit, RowInfluence[] all, RowInfluence[] studentised, double[] fitted, bool weighted, DrawnRows drawn)
    {
        var (store, high) = (fit.Store, 2 * fit.Fit.Rank / fit.Fit.N);
        var fittedAt = all.Zip(fitted).ToDictionary(pair => pair.First.Position, pair => pair.Second);
        PointCloud Cloud(IEnumerable<RowInfluence> rows, Func<RowInfluence, double> x, Func<RowInfluence, double> y, bool trend) =>
            PointClouds.Of([.. rows.Select(row => new PlotPoint(x(row), y(row), store.CopiesOf(row.Position)))], trend) with { OneIn = drawn.OneIn };

        return new ResidualPlots(
            Cloud(all, row => fittedAt[row.Position], row => store.Residuals[row.Position], trend: true),
            NormalPlots.Of(studentised.Where(row => drawn.IsAtRandom(row.Position)).Select(row => (Standardised(fit, row), store.CopiesOf(row.Position)))),
            Cloud(studentised, row => fittedAt[row.Position], row => Math.Sqrt(Math.Abs(row.StudentisedResidual!.Value)), trend: true),
            Cloud(studentised, row => row.Leverage, row => row.StudentisedResidual!.Value, trend: false),
            [], high, store.Leverages.Count(leverage => leverage > high), weighted, drawn.OneIn == 1 ? all.Length - studentised.Length : drawn.LeverageOne);
    }

    private static double Standardised(CheckedFit fit, RowInfluence row) =>
        fit.Store.Residuals[row.Position] / (fit.Fit.Sigma!.Value * Math.Sqrt(1 - row.Leverage));

    private static IReadOnlyList<NamedPoint> MostInfluential(RowInfluence[] studentised, RowSubset rows, DataColumn? label) =>
    [
        .. studentised.Where(row => row.CooksDistance > 0).OrderByDescending(row => row.CooksDistance).ThenBy(row => row.Position).Take(Named)
            .Select(row => new NamedPoint(
                rows[row.Position] + 1, label?.Text(rows[row.Position]), row.Leverage, row.StudentisedResidual!.Value, row.CooksDistance!.Value)),
    ];
}
