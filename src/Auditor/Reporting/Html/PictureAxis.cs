using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>One axis of a picture: from values to places, and round ticks between.</summary>
/// <param name="From">Place of the lowest value.</param>
/// <param name="To">Place of the highest value.</param>
internal sealed record PictureAxis(double Low, double High, double From, double To)
{
    private const double Margin = 0.04;
    private const double NarrowestRange = 1e-9;
    private static readonly double[] Steps = [1, 2, 5, 10];

    /// <summary>What its values are when it is an axis of time.</summary>
    public TimeScale? Time { get; init; }

    /// <summary>Covers all values with a small margin; a range too narrow to divide is widened.</summary>
    public static PictureAxis Covering(IEnumerable<double> values, double from, double to)
    {
        var all = values.ToList();
        double low = all.Min(), high = all.Max();
        double size = Math.Max(Math.Abs(low), Math.Abs(high));
        double range = high - low > NarrowestRange * size ? high - low : size > 0 ? 0.2 * size : 2;
        double middle = low + ((high - low) / 2);
        double half = range * (0.5 + Margin);
        return new PictureAxis(middle - half, middle + half, from, to);
    }

    public double At(double value) => From + ((To - From) * (value - Low) / (High - Low));

    /// <summary>Round values within the range.</summary>
    /// <param name="most">Most steps that have room.</param>
    public IReadOnlyList<PictureTick> Ticks(int most)
    {
        if (Time == TimeScale.Date)
        {
            return CalendarTicks.Of(this, most);
        }

        double step = Step(High - Low, most);
        double first = Math.Ceiling(Low / step), last = Math.Floor(High / step);
        return [.. Enumerable.Range(0, (int)(last - first) + 1).Select(index => Tick((first + index) * step, step))];
    }

    private PictureTick Tick(double value, double step) => new(PicturePath.Place(At(value)), Time is null ? NumberText.Tick(value, step) : NumberText.Label(Math.Round(value / step) * step));

    /// <summary>The smallest of 1, 2 and 5 times a power of ten that gives few enough steps.</summary>
    private static double Step(double range, int most)
    {
        double power = Math.Pow(10, Math.Floor(Math.Log10(range / most)));
        return power * Steps.First(step => range / (power * step) <= most || step == Steps[^1]);
    }
}
