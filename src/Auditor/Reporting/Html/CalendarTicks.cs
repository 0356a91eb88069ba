using System.Globalization;

namespace Auditor.Reporting.Html;

/// <summary>Round dates on an axis of days: the first of January of round years, the first of a month, or single days.</summary>
internal static class CalendarTicks
{
    private const double DaysOfYear = 365.2425;
    private const double FewestDaysForYears = 3.5 * DaysOfYear;
    private const double FewestDaysForMonths = 62;
    private static readonly int[] Years = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000];
    private static readonly int[] Months = [1, 2, 3, 6, 12];
    private static readonly int[] Days = [1, 2, 3, 7, 14];

    /// <param name="axis">Its values are days since 0001-01-01.</param>
    /// <param name="most">Most steps that have room.</param>
    public static IReadOnlyList<PictureTick> Of(PictureAxis axis, int most)
    {
        var (low, high) = (DateOnly.FromDayNumber((int)Math.Max(0, Math.Ceiling(axis.Low))), DateOnly.FromDayNumber((int)Math.Min(DateOnly.MaxValue.DayNumber, axis.High)));
        var days = axis.High - axis.Low;
        return days >= FewestDaysForYears ? OfYears(axis, low, high, Step(Years, days / DaysOfYear, most))
            : days >= FewestDaysForMonths ? OfMonths(axis, low, high, Step(Months, days * 12 / DaysOfYear, most))
            : OfDays(axis, low, high, Step(Days, days, most));
    }

    private static int Step(int[] steps, double range, int most) => steps.FirstOrDefault(step => range / step <= most, steps[^1]);

    private static List<PictureTick> OfYears(PictureAxis axis, DateOnly low, DateOnly high, int step) =>
    [
        .. Enumerable.Range(low.Year, high.Year - low.Year + 1).Where(year => year % step == 0).Select(year => new DateOnly(year, 1, 1))
            .Where(day => day >= low).Select(day => Tick(axis, day, "yyyy")),
    ];

    private static List<PictureTick> OfMonths(PictureAxis axis, DateOnly low, DateOnly high, int step) =>
    [
        .. Enumerable.Range(0, (12 * (high.Year - low.Year)) + high.Month - low.Month + 1).Select(month => new DateOnly(low.Year, low.Month, 1).AddMonths(month))
            .Where(day => day >= low && (day.Month - 1) % step == 0).Select(day => Tick(axis, day, "yyyy-MM")),
    ];

    private static List<PictureTick> OfDays(PictureAxis axis, DateOnly low, DateOnly high, int step) =>
    [
        .. Enumerable.Range(low.DayNumber, high.DayNumber - low.DayNumber + 1).Where(day => day % step == 0)
            .Select(day => Tick(axis, DateOnly.FromDayNumber(day), "MM-dd")),
    ];

    private static PictureTick Tick(PictureAxis axis, DateOnly day, string format) =>
        new(PicturePath.Place(axis.At(day.DayNumber)), day.ToString(format, CultureInfo.InvariantCulture));
}
