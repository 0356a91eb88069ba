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

    /// <param name="influence">Every row, or none when the fit leaves no residuals.</param>
    /// <param name="label">The declared row label; null when there is none.</param>
    /// <param name="weighted">The fit has weights that are no counts.</param>
    public static PlotData Of(CheckedFit fit, IReadOnlyList<RowInfluence> influence, RowSubset rows, DataColumn? label, bool weighted)
    {
        RowInfluence[] studentised = [.. influence.Where(row => row.StudentisedResidual is not null)];
        if (studentised.Length == 0)
        {
            return new PlotData(null, "the final model leaves no residuals: it fits to rounding, or no degrees of freedom are left");
        }

        var fitted = FittedValues.Of(fit);
        return fitted.Concat(fit.Store.Residuals).All(value => Math.Abs(value) < Largest)
            ? new PlotData(Plots(fit, influence, studentised, fitted, weighted) with { Named = MostInfluential(studentised, rows, label) }, null)
            : new PlotData(null, "the response's numbers are too large to draw");
    }

    private static ResidualPlots Plots(CheckedFit fit, IReadOnlyList<RowInfluence> all, RowInfluence[] studentised, double[] fitted, bool weighted)
    {
        var (store, high) = (fit.Store, 2 * fit.Fit.Rank / fit.Fit.N);
        PlotPoint Point(RowInfluence row, double x, double y) => new(x, y, store.CopiesOf(row.Position));
        return new ResidualPlots(
            PointClouds.Of([.. all.Select(row => Point(row, fitted[row.Position], store.Residuals[row.Position]))], trend: true),
            NormalPlots.Of(studentised.Select(row => (Standardised(fit, row), store.CopiesOf(row.Position)))),
            PointClouds.Of([.. studentised.Select(row => Point(row, fitted[row.Position], Math.Sqrt(Math.Abs(row.StudentisedResidual!.Value))))], trend: true),
            PointClouds.Of([.. studentised.Select(row => Point(row, row.Leverage, row.StudentisedResidual!.Value))], trend: false),
            [], high, all.Count(row => row.Leverage > high), weighted, all.Count - studentised.Length);
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
