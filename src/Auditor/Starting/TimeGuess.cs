using System.Globalization;
using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;

namespace Auditor.Starting;

/// <summary>The column that most likely orders the rows in time, and the step to count in.</summary>
/// <param name="Middle">The middle one of its distinct values, where a split would cut.</param>
/// <param name="Step">The period to declare; null for numbers, which step by 1.</param>
/// <param name="StepNote">Where the guess of the period comes from.</param>
internal sealed record TimeGuess(string Column, string Middle, string? Step, string StepNote)
{
    /// <summary>With fewer periods next to nothing can be rejected, so that a shorter one is proposed.</summary>
    private const int FewestPeriods = 12;

    /// <summary>Shares of the periods that hold a day of a regular series; days have week-ends and holidays. Our own choice.</summary>
    private const double MostPeriods = 0.9;

    private const double MostDays = 0.6;

    private const string Day = "day";

    private const int FirstYear = 1900;

    private const int LastYear = 2100;

    private const string NeverWithout = "left out, every day is a period, which is wrong for columns that follow months or quarters";

    private static readonly IReadOnlyList<(Period Period, string Word)> _steps =
        [(Period.Year, "year"), (Period.Quarter, "quarter"), (Period.Month, "month"), (Period.Week, "week"), (Period.Day, Day)];

    /// <summary>The column of dates with the fewest gaps, else one of years; null when neither is there.</summary>
    public static TimeGuess? Of(IReadOnlyList<ColumnProfile> columns) =>
        columns.Where(IsDates).MinBy(column => column.Missing) is { } dates ? OfDates(dates)
        : columns.FirstOrDefault(IsYears) is { } years ? new TimeGuess(years.Name, MiddleOf([.. years.Numbers.Order()]).ToString(CultureInfo.InvariantCulture), null, "")
        : null;

    private static bool IsDates(ColumnProfile column) => column is { Kind: ColumnKind.Date, Odd.Count: 0, Texts.Count: > 1 };

    private static bool IsYears(ColumnProfile column) =>
        column is { IsWhole: true, Odd.Count: 0, Texts.Count: > 2 } && column.Numbers.All(number => number is >= FirstYear and <= LastYear);

    private static TimeGuess OfDates(ColumnProfile column)
    {
        int[] days = [.. column.Texts.Select(text => CellText.TryDay(text, out var day) ? day : 0).Distinct().Order()];
        var (word, seen) = _steps.FirstOrDefault(step => IsSpacing(step.Period, days)).Word is { } apart && (apart != Day || column.IsUnique)
            ? (apart, $"its days lie a {apart} apart")
            : (Within(days), string.Create(CultureInfo.InvariantCulture, $"its {days.Length} days show no regular step"));
        return new TimeGuess(column.Name, PeriodIndex.Label(Period.Day, MiddleOf(days)), word, $"dates need it: a guess, since {seen}; {NeverWithout}");
    }

    /// <summary>No period holds two of the days, and few between the first and the last hold none.</summary>
    private static bool IsSpacing(Period period, int[] days) =>
        Periods(period, days) == days.Length
        && days.Length >= (period == Period.Day ? MostDays : MostPeriods) * (PeriodIndex.Of(period, days[^1]) - PeriodIndex.Of(period, days[0]) + 1);

    /// <summary>Months, or what is shorter where they would be few.</summary>
    private static string Within(int[] days) =>
        _steps.SkipWhile(step => step.Period != Period.Month).FirstOrDefault(step => Periods(step.Period, days) >= FewestPeriods, _steps[^1]).Word;

    private static int Periods(Period period, int[] days) => days.Select(day => PeriodIndex.Of(period, day)).Distinct().Count();

    private static T MiddleOf<T>(T[] ordered) => ordered[(ordered.Length - 1) / 2];
}
