using Auditor.Data;
using Auditor.Design;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>The points of the pictures in time order; nothing where no time is declared.</summary>
internal static class TimePlots
{
    /// <summary>Residuals drawn one by one, and periods drawn one by one.</summary>
    public const int MostPoints = 400;

    private const int MostLags = 36;
    private const double LowerQuartile = 0.25;
    private const double UpperQuartile = 0.75;

    public static TimePlot? InTime(BoundModel model, CheckedFit fit, SerialInputs inputs, RowSubset rows)
    {
        if (model.Structure.Time is not { } time)
        {
            return null;
        }

        var structure = model.Structure.Among(rows);
        var periods = structure.Periods!;
        var units = structure.Units?.Count;
        var single = (units ?? 1) == 1 && periods.Count == rows.Count && periods.Count <= MostPoints;
        var each = single ? 1 : (periods.Count + MostPoints - 1) / MostPoints;
        var members = Enumerable.Range(0, rows.Count).GroupBy(position => periods.Codes[position] / each).OrderBy(run => run.Key);
        var points = members.Select(run => Point([.. run], fit.Store, Times(time, rows), position => periods.Label(periods.Codes[position]))).ToList();
        var steps = StepsOf(time, rows, periods);
        return new TimePlot(
            [.. points.Select((point, at) => point with { Follows = at > 0 && (each > 1 || steps is null || steps[at] == steps[at - 1] + 1) })],
            time.Column is DateColumn ? TimeScale.Date : TimeScale.Number,
            time.Column?.Name ?? "place in the file’s order",
            single, each, rows.Count, units, periods.Count, Between(fit.Store, periods)) is var plot && inputs.Order is { } order
                ? WithNeighbours(plot, new SerialFit(fit, order, inputs.LaggedResponse))
                : plot;
    }

    public static AutocorrelationPlot? Autocorrelations(BoundModel model, CheckedFit fit, SerialInputs inputs, RowSubset rows)
    {
        if (inputs.Order is not { } order)
        {
            return null;
        }

        var structure = model.Structure.Among(rows);
        var found = Autocorrelation.Of(new SerialFit(fit, order, inputs.LaggedResponse), Lags(structure.Periods!.Count));
        LagPoint[] lags = [.. (found ?? []).Where(lag => lag.Pairs > 0).Select(lag => new LagPoint(lag.Lag, lag.Value, lag.Pairs, lag.Band(rows.Count)))];
        return lags.Length == 0 ? null : new AutocorrelationPlot(lags, rows.Count, structure.Units?.Count, inputs.LaggedResponse);
    }

    /// <summary>10 log10 of the periods, as R's acf takes by default, but no more than half of them.</summary>
    private static int Lags(int periods) => Math.Min(MostLags, Math.Min((int)(10 * Math.Log10(periods)), periods / 2));

    /// <summary>The time of a row as a number.</summary>
    private static Func<int, double> Times(TimeAxis time, RowSubset rows) => position =>
        time.Column is null ? time.Steps![rows[position]] + 1 : time.Moments[rows[position]];

    private static TimePoint Point(int[] positions, ResidualStore store, Func<int, double> time, Func<int, string> label)
    {
        var first = positions.MinBy(time);
        var (sum, count) = (positions.Sum(position => store.CopiesOf(position) * store.Residuals[position]), positions.Sum(position => store.CopiesOf(position)));
        (double Value, double Copies)[] ordered = [.. positions.Select(position => (store.Residuals[position], store.CopiesOf(position))).Order()];
        return new TimePoint(time(first), label(first), sum / count, Quantile(ordered, count, LowerQuartile), Quantile(ordered, count, UpperQuartile), count, false);
    }

    /// <summary>Linear between the two nearest of the observations in order (type 7 of Hyndman and Fan 1996).</summary>
    private static double Quantile((double Value, double Copies)[] ordered, double count, double share)
    {
        var place = (count - 1) * share;
        var (below, above) = (At(ordered, Math.Floor(place)), At(ordered, Math.Ceiling(place)));
        return below + ((above - below) * (place - Math.Floor(place)));
    }

    private static double At((double Value, double Copies)[] ordered, double place)
    {
        var before = 0.0;
        return ordered.First(item => (before += item.Copies) > place).Value;
    }

    /// <summary>The number of each period; null where periods cannot be counted.</summary>
    private static long[]? StepsOf(TimeAxis time, RowSubset rows, RowGroups periods)
    {
        if (time.Steps is not { } steps)
        {
            return null;
        }

        var numbers = new long[periods.Count];
        for (var position = 0; position < rows.Count; position++)
        {
            numbers[periods.Codes[position]] = steps[rows[position]];
        }

        return numbers;
    }

    private static double Between(ResidualStore store, RowGroups periods)
    {
        var (sums, counts) = (new double[periods.Count], new double[periods.Count]);
        for (var position = 0; position < store.Residuals.Count; position++)
        {
            sums[periods.Codes[position]] += store.CopiesOf(position) * store.Residuals[position];
            counts[periods.Codes[position]] += store.CopiesOf(position);
        }

        var mean = sums.Sum() / counts.Sum();
        var all = store.Residuals.Select((e, position) => store.CopiesOf(position) * (e - mean) * (e - mean)).Sum();
        return all > 0 ? sums.Zip(counts, (sum, count) => ((sum / count) - mean) * ((sum / count) - mean) * count).Sum() / all : 0;
    }

    private static TimePlot WithNeighbours(TimePlot plot, SerialFit fit)
    {
        var signs = fit.Order.Positions.Select(position => Math.Sign(fit.Fit.Store.Residuals[position])).ToArray();
        var lag = fit.Order.Lag(1);
        var pairs = Enumerable.Range(0, signs.Length).Where(at => lag[at] >= 0).ToList();
        return plot with { Neighbours = pairs.Count, SameSide = pairs.Count(at => signs[at] == signs[lag[at]]) };
    }
}
