using System.Globalization;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>The number of the calendar period that a day lies in: days of one period share it, the next period has the next number.</summary>
public static class PeriodIndex
{
    /// <param name="day">Days since 0001-01-01, a Monday; weeks begin on Mondays (ISO 8601).</param>
    public static int Of(Period period, int day) => period switch
    {
        Period.Day => day,
        Period.Week => day / 7,
        Period.Month => Month(day),
        Period.Quarter => Month(day) / 3,
        _ => DateOnly.FromDayNumber(day).Year,
    };

    /// <summary>The season a day lies in, from 1: the quarter or the month of the year.</summary>
    public static int SeasonOf(Period by, int day) =>
        by == Period.Month ? (Month(day) % 12) + 1 : (Month(day) / 3 % 4) + 1;

    /// <summary>What to call the period a day lies in: 2008-09-15, 2008-W38 (ISO 8601), 2008-09, 2008-Q3 or 2008.</summary>
    public static string Label(Period period, int day)
    {
        var date = DateOnly.FromDayNumber(day).ToDateTime(TimeOnly.MinValue);
        return period switch
        {
            Period.Day => date.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture),
            Period.Week => string.Create(CultureInfo.InvariantCulture, $"{ISOWeek.GetYear(date):0000}-W{ISOWeek.GetWeekOfYear(date):00}"),
            Period.Month => date.ToString("yyyy-MM", CultureInfo.InvariantCulture),
            Period.Quarter => string.Create(CultureInfo.InvariantCulture, $"{date.Year:0000}-Q{SeasonOf(Period.Quarter, day)}"),
            _ => date.Year.ToString("0000", CultureInfo.InvariantCulture),
        };
    }

    private static int Month(int day)
    {
        var date = DateOnly.FromDayNumber(day);
        return (12 * date.Year) + date.Month - 1;
    }
}
