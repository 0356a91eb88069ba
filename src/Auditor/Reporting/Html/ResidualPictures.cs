using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The pictures of the final model's residuals: four, and two more where a time order is declared.</summary>
internal static class ResidualPictures
{
    public static IReadOnlyList<Picture> Of(AuditRecord record, double level)
    {
        if (record.Plots?.Plots is not { } plots)
        {
            return [];
        }

        var findings = new CheckFindings(record.Checks, level);
        return [Fitted(plots, findings), Normal(plots.Normal, findings), Scale(plots, findings), Leverage(plots, findings), .. TimePictures.Of(plots, findings)];
    }

    private static Picture Fitted(ResidualPlots plots, CheckFindings findings)
    {
        var (cloud, zero) = (plots.Fitted, 0.0);
        var x = Picture.Horizontal(cloud.Points.Select(point => point.X));
        var y = Picture.Vertical(cloud.Points.Select(point => point.Y).Append(zero));
        return new(
            "residuals-fitted", "Residuals against fitted values", findings.Title(CheckFindings.Form), findings.Evidence(CheckFindings.Form),
            (PictureParts.Dots(cloud) + Trend(cloud, "mean residual")).Trim(), "Fitted value" + PictureParts.Units, PictureParts.Residual(plots.Weighted),
            x, y, [PictureParts.Level(zero, x, y), .. PictureParts.Cloud(cloud, x, y)], []);
    }

    private static Picture Normal(NormalPlot plot, CheckFindings findings)
    {
        var x = Picture.Horizontal(plot.Points.Select(point => point.Z));
        var y = Picture.Vertical(plot.Points.SelectMany(point => new[] { point.Residual, point.Lower, point.Upper }));
        var dots = plot.Points.Select(point => new PlotPoint(point.Z, point.Residual, 1));
        string shown = plot.Points.Count < plot.N ? $"{NumberText.Count(plot.Points.Count)} of the {NumberText.Count(plot.N)} residuals in order, both ends whole. " : "";
        return new(
            "residuals-normal", "Normal quantiles", findings.Title(CheckFindings.Normality),
            $"{findings.Evidence(CheckFindings.Normality)} {NumberText.Count(plot.Outside)} of {NumberText.Count(plot.Points.Count)} points lie outside the envelope; about 5\u00A0% would by chance alone.",
            shown + "Shaded: where 95\u00A0% of normal values of that rank lie, rank by rank and not for all at once (beta quantiles of uniform order statistics through the normal "
            + "quantile; David and Nagaraja 2003). Residuals are taken as independent there, which they are nearly when rows are many.",
            "Normal quantile of the rank", "Standardised residual",
            x, y,
            [
                PicturePath.Band("band", [.. plot.Points.Select(point => (point.Z, point.Lower))], [.. plot.Points.Select(point => (point.Z, point.Upper))], x, y),
                PicturePath.Line("level", [(plot.Points[0].Z, plot.Points[0].Z), (plot.Points[^1].Z, plot.Points[^1].Z)], x, y),
                .. PicturePath.Dots(dots, x, y),
            ],
            []);
    }

    private static Picture Scale(ResidualPlots plots, CheckFindings findings)
    {
        var cloud = plots.Scale;
        var x = Picture.Horizontal(cloud.Points.Select(point => point.X));
        var y = Picture.Vertical(cloud.Points.Select(point => point.Y).Append(0));
        return new(
            "residuals-scale", "Scale against fitted values", findings.Title(CheckFindings.EqualVariance), findings.Evidence(CheckFindings.EqualVariance),
            (PictureParts.Dots(cloud) + Trend(cloud, "mean height; level when the spread is equal")).Trim(), "Fitted value" + PictureParts.Units, "Root of the absolute studentised residual",
            x, y, PictureParts.Cloud(cloud, x, y), []);
    }

    private static Picture Leverage(ResidualPlots plots, CheckFindings findings)
    {
        var cloud = plots.Leverage;
        // A named row may have gone into a cell of the grid: it is drawn again, at its own place.
        var named = plots.Named.Select(point => (point.X, point.Y)).ToList();
        var x = Picture.Horizontal(cloud.Points.Select(point => point.X).Concat(named.Select(point => point.X)).Append(0).Append(plots.HighLeverage));
        var y = Picture.Vertical(cloud.Points.Select(point => point.Y).Concat(named.Select(point => point.Y)).Append(0));
        var high = PicturePath.Line("bound", [(plots.HighLeverage, y.Low), (plots.HighLeverage, y.High)], x, y);
        return new(
            "residuals-leverage", "Leverage against studentised residuals", LeverageTitle(plots),
            (LargestByCook(plots.Named) + " " + findings.Evidence(CheckFindings.Outlier) + LeverageOne(plots.LeverageOne)).Trim(),
            PictureParts.Dots(cloud) + $"Dashed: leverage {NumberText.Share(plots.HighLeverage)}, twice the mean (common practice). Named: the largest Cook’s distances.",
            "Leverage", "Studentised residual",
            x, y, [PictureParts.Level(0, x, y), high, .. PictureParts.Cloud(cloud, x, y), PicturePath.Marks("dot named", named, x, y)], PictureLabels.Of(plots.Named, x, y));
    }

    private static string LeverageTitle(ResidualPlots plots) => plots.AboveHighLeverage switch
    {
        0 => "No row has more than twice the mean leverage",
        1 => "One row has more than twice the mean leverage",
        int count => $"{NumberText.Count(count)} of {NumberText.Count(plots.Fitted.Rows)} rows have more than twice the mean leverage",
    };

    private static string LargestByCook(IReadOnlyList<NamedPoint> named) => named.Count == 0
        ? "No row moves the fit."
        : $"{PictureLabels.Text(named[0])} has the largest Cook’s distance, {NumberText.Share(named[0].CooksDistance)}, "
            + $"with leverage {NumberText.Share(named[0].X)} and studentised residual {NumberText.Share(named[0].Y)}.";

    private static string LeverageOne(int rows) => rows switch
    {
        0 => "",
        1 => " One row through which the fit passes has no studentised residual and is not drawn.",
        _ => $" {NumberText.Count(rows)} rows through which the fit passes have no studentised residual and are not drawn.",
    };

    private static string Trend(PointCloud cloud, string what) => cloud.Trend.Count > 0 ? $"Line: {what} over runs of rows with like fitted values." : "";
}
