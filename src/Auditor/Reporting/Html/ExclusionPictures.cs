using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The pictures of one left-out group: what it adds, what is left over against its columns, what the rows could show.</summary>
internal static class ExclusionPictures
{
    private const int LongestName = 40;

    /// <param name="power">The power that the policy asks for.</param>
    /// <param name="weighted">Residuals are sqrt(w) e.</param>
    public static IReadOnlyList<Picture> Of(Exclusion exclusion, GroupPlots? plots, string anchor, double power, bool weighted)
    {
        var pictures = new List<Picture>();
        if (plots is not null)
        {
            pictures.Add(Added(exclusion, plots.Added, anchor, weighted));
            pictures.AddRange(plots.Columns.Select((column, index) => Column(column, string.Create(CultureInfo.InvariantCulture, $"{anchor}-column-{index + 1}"), weighted)));
        }

        if (exclusion.PowerCurve.Count > 0)
        {
            pictures.Add(PowerCurve(exclusion, anchor, power));
        }

        return pictures;
    }

    private static Picture Added(Exclusion exclusion, AddedVariablePlot plot, string anchor, bool weighted)
    {
        var x = Picture.Horizontal(plot.Cloud.Points.Select(point => point.X).Append(0));
        var y = Picture.Vertical(plot.Cloud.Points.Select(point => point.Y).Append(0));
        string share = exclusion.PartialRSquared.Estimate is double estimate ? NumberText.Share(100 * estimate) + "\u00A0%" : "an unknown share";
        string across = plot.Column is { } column
            ? $"{ShortName.Of(column, LongestName)}, less what the final model explains of it"
            : "What the group’s columns add to the fit" + PictureParts.Units;
        string slope = plot.Column is null
            ? "The line has slope 1: it is what the columns together would add."
            : $"The line’s slope, {NumberText.Number(plot.Slope)}, is the coefficient that the column would get.";
        return new(
            anchor + "-added", "What the group adds", $"It takes up {share} of the variation that is left over",
            $"That share is the partial R², on {NumberText.Count(plot.Cloud.Rows)} rows.",
            PictureParts.Dots(plot.Cloud) + slope + " Dots far to the side weigh most.",
            across, PictureParts.Residual(weighted), x, y,
            [PictureParts.Level(0, x, y), .. PictureParts.Cloud(plot.Cloud, x, y), PictureParts.Through(plot.Slope, x, y)], []);
    }

    private static Picture Column(ColumnPlot plot, string anchor, bool weighted)
    {
        var cloud = plot.Cloud;
        var x = Picture.Horizontal(cloud.Points.Select(point => point.X));
        var y = Picture.Vertical(cloud.Points.Select(point => point.Y).Append(0));
        string name = ShortName.Of(plot.Column, LongestName);
        return new(
            anchor, "Residuals against " + name, Wander(cloud),
            $"{NumberText.Count(cloud.Rows)} rows.",
            PictureParts.Dots(cloud) + (cloud.Trend.Count > 1 ? "Line: mean residual over runs of rows with like values; level at 0 when the column has nothing to add." : ""),
            name, PictureParts.Residual(weighted), x, y, [PictureParts.Level(0, x, y), .. PictureParts.Cloud(cloud, x, y)], []);
    }

    /// <summary>How far the mean residual wanders along the column.</summary>
    private static string Wander(PointCloud cloud) => cloud.Trend.Count > 1
        ? $"The mean residual runs from {NumberText.Share(cloud.Trend.Min(point => point.Y))} to {NumberText.Share(cloud.Trend.Max(point => point.Y))}"
        : "Too few rows or values for a mean along it";

    private static Picture PowerCurve(Exclusion exclusion, string anchor, double power)
    {
        var curve = exclusion.PowerCurve;
        double bound = exclusion.Negligible.Bound;
        var x = PictureAxis.Covering(curve.Select(point => point.PartialRSquared), Picture.Left, Picture.Right);
        var y = PictureAxis.Covering([0, 1], Picture.Bottom, Picture.Top);
        string chance = exclusion.Power.AtBound is double at ? NumberText.Percent(Math.Round(at, 3)) : "an unknown chance";
        string reliable = exclusion.Power.SmallestDetectableFSquared is double f
            ? $"{NumberText.Percent(power)} is reached at a partial R² of {NumberText.Share(f / (1 + f))}."
            : $"{NumberText.Percent(power)} is not reached.";
        return new(
            anchor + "-power", "What these rows could show", $"An effect at the bound would be found with {chance} chance",
            reliable,
            $"Line: chance that the test the verdict rests on rejects, before adjustment, at the rows these data are worth. Dashed: the bound {NumberText.Plain(bound)} and the policy’s power {NumberText.Percent(power)}.",
            "Partial R² in truth", "Chance to reject", x, y,
            [
                PicturePath.Line("bound", [(bound, y.Low), (bound, y.High)], x, y),
                PicturePath.Line("bound", [(x.Low, power), (x.High, power)], x, y),
                PicturePath.Line("trend", curve.Select(point => (point.PartialRSquared, point.Power)), x, y),
            ],
            []);
    }
}
