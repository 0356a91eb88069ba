using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The pictures of the final model's residuals in the declared time order.</summary>
internal static class TimePictures
{
    public static IEnumerable<Picture> Of(ResidualPlots plots, CheckFindings findings)
    {
        if (plots.InTime is { } time)
        {
            yield return InTime(time, plots.Weighted, findings);
        }

        if (plots.Autocorrelations is { } correlations)
        {
            yield return Autocorrelations(correlations, findings);
        }
    }

    private static Picture InTime(TimePlot plot, bool weighted, CheckFindings findings)
    {
        var x = Picture.Horizontal(plot.Points.Select(point => point.X)) with { Time = plot.Scale };
        var y = Picture.Vertical(plot.Points.SelectMany(point => plot.Single ? [point.Mean] : new[] { point.Mean, point.Lower, point.Upper }).Append(0));
        var stretches = Stretches(plot.Points).ToList();
        var dots = plot.Points.Select(point => new PlotPoint(point.X, point.Mean, 1));
        return new(
            "residuals-time", "Residuals in time order", TimeTitle(plot), TimeFinding(plot, findings), Reading(plot),
            "Time: " + plot.Time, PictureParts.Residual(weighted), x, y,
            [
                .. plot.Single ? [] : stretches.Select(stretch => Spread(stretch, x, y)),
                PictureParts.Level(0, x, y),
                .. stretches.Where(stretch => stretch.Count > 1).Select(stretch => PicturePath.Line("join", stretch.Select(point => (point.X, point.Mean)), x, y)),
                .. PicturePath.Dots(dots, x, y),
            ],
            []);
    }

    private static string TimeTitle(TimePlot plot) => plot.Single && plot.Neighbours is > 0 and var pairs
        ? $"{NumberText.Count(plot.SameSide)} of {NumberText.Count(pairs)} neighbours in time lie on the same side of zero"
        : $"The means of the periods carry {NumberText.Percent(Math.Round(plot.Between, 3))} of the residuals’ variation";

    private static string TimeFinding(TimePlot plot, CheckFindings findings)
    {
        var (lowest, highest) = (plot.Points.MinBy(point => point.Mean)!, plot.Points.MaxBy(point => point.Mean)!);
        string what = plot.Single ? "Residuals" : "Mean residuals";
        string range = $"{what} run from {NumberText.Share(lowest.Mean)} ({lowest.Label}) to {NumberText.Share(highest.Mean)} ({highest.Label}).";
        string chance = plot.Single
            ? "About half would by chance alone."
            : $"About {NumberText.Percent(Math.Round((plot.Periods - 1.0) / Math.Max(1, plot.Rows - 1), 4))} would by chance alone, if rows were independent.";
        return $"{chance} {range} {findings.Evidence(CheckFindings.Independence)}".TrimEnd();
    }

    private static string Reading(TimePlot plot)
    {
        string of = plot.Units is int units ? $" of {NumberText.Count(units)} {(units == 1 ? "unit" : "units")}" : "";
        string gaps = plot.Points.Skip(1).Any(point => !point.Follows) ? " The line is broken where a period is missing." : "";
        string periods = plot.PeriodsOfPoint > 1 ? $"{NumberText.Count(plot.PeriodsOfPoint)} neighbouring periods" : "period";
        return plot.Single
            ? $"{NumberText.Count(plot.Rows)} rows{of}, one residual a period." + gaps
            : $"{NumberText.Count(plot.Rows)} rows{of} in {NumberText.Count(plot.Periods)} periods. Dots: the mean residual of each {periods}; shaded: the middle half of its residuals." + gaps;
    }

    /// <summary>Points that follow each other without a missing period.</summary>
    private static IEnumerable<List<TimePoint>> Stretches(IReadOnlyList<TimePoint> points)
    {
        var stretch = new List<TimePoint>();
        foreach (var point in points)
        {
            if (!point.Follows && stretch.Count > 0)
            {
                yield return stretch;
                stretch = [];
            }

            stretch.Add(point);
        }

        yield return stretch;
    }

    private static PicturePath Spread(List<TimePoint> stretch, PictureAxis x, PictureAxis y) => PicturePath.Band(
        "band", [.. stretch.Select(point => (point.X, point.Lower))], [.. stretch.Select(point => (point.X, point.Upper))], x, y);

    private static Picture Autocorrelations(AutocorrelationPlot plot, CheckFindings findings)
    {
        var x = PictureAxis.Covering([0, plot.Lags[^1].Lag + 0.5], Picture.Left, Picture.Right);
        var y = Picture.Vertical(plot.Lags.SelectMany(lag => new[] { lag.Correlation, lag.Band, -lag.Band }).Append(0));
        return new(
            "residuals-autocorrelation", "Autocorrelation by lag", CorrelationTitle(plot), CorrelationFinding(plot, findings), CorrelationReading(plot),
            "Lag, in periods", "Autocorrelation of the residuals",
            x, y,
            [
                PicturePath.Band("band", [.. plot.Lags.Select(lag => ((double)lag.Lag, -lag.Band))], [.. plot.Lags.Select(lag => ((double)lag.Lag, lag.Band))], x, y),
                PictureParts.Level(0, x, y),
                PicturePath.Bars("bar", plot.Lags.Select(lag => ((double)lag.Lag, lag.Correlation)), x, y),
            ],
            []);
    }

    private static string CorrelationTitle(AutocorrelationPlot plot) => plot.Lags.Count(Outside) switch
    {
        0 => plot.Lags.Count == 1 ? "The one lag lies within the band" : $"All {NumberText.Count(plot.Lags.Count)} lags lie within the band",
        var all when all == plot.Lags.Count => all == 1 ? "The one lag lies outside the band" : $"All {NumberText.Count(all)} lags lie outside the band",
        var outside => $"{NumberText.Count(outside)} of {NumberText.Count(plot.Lags.Count)} lags {(outside == 1 ? "lies" : "lie")} outside the band",
    };

    private static string CorrelationFinding(AutocorrelationPlot plot, CheckFindings findings)
    {
        var largest = plot.Lags.MaxBy(lag => Math.Abs(lag.Correlation))!;
        string first = largest.Lag == plot.Lags[0].Lag ? "" : $"; at lag {NumberText.Count(plot.Lags[0].Lag)} it is {NumberText.Share(plot.Lags[0].Correlation)}";
        return $"The largest is {NumberText.Share(largest.Correlation)}, at lag {NumberText.Count(largest.Lag)}{first}. About 5\u00A0% of lags would lie outside by chance alone. {findings.Evidence(CheckFindings.Independence)}".TrimEnd();
    }

    private static string CorrelationReading(AutocorrelationPlot plot) =>
        "Bars: how far residuals go with those so many periods before" + (plot.Units > 1 ? " in the same unit" : "")
        + "; only pairs exactly so far apart count. Shaded: where 95\u00A0% of them lie for independent errors, lag by lag and not for all at once; residuals stay a little nearer to zero."
        + (plot.LaggedResponse ? " With an earlier value of the response among the terms the band is too wide at the first lags." : "");

    private static bool Outside(LagPoint lag) => Math.Abs(lag.Correlation) > lag.Band;
}
