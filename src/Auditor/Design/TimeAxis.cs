using System.Globalization;
using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>
/// The declared time of every row of a table: when it is, in which period it lies and, where periods can be counted, the number of that period.
/// Without a declared period each distinct date or number is one; in the file's own order the period is the row's place among the rows of its unit.
/// </summary>
public sealed class TimeAxis
{
    /// <summary>The step of a row without time.</summary>
    internal const long NoStep = long.MinValue;

    private const double LargestWhole = 9_007_199_254_740_992;

    private TimeAxis(DataColumn? column, double[] moments, ClassedRows periods, long[]? steps, string? noSteps) =>
        (Column, Moments, Periods, Steps, NoSteps) = (column, moments, periods, steps, noSteps);

    /// <summary>The column of time; null for the file's own order.</summary>
    public DataColumn? Column { get; }

    /// <summary>The period of each row.</summary>
    public ClassedRows Periods { get; }

    /// <summary>The exact time of each row, NaN where missing: it orders rows within a period.</summary>
    internal double[] Moments { get; }

    /// <summary>The number of each row's period, such that neighbouring periods differ by 1; null when periods cannot be counted.</summary>
    internal long[]? Steps { get; }

    /// <summary>Why not.</summary>
    internal string? NoSteps { get; }

    /// <param name="units">The unit of each row, within which file order runs; null for one series.</param>
    internal static TimeAxis OfFileOrder(int rows, ClassedRows? units)
    {
        var (steps, next) = (new long[rows], new long[units?.Count ?? 1]);
        for (var row = 0; row < rows; row++)
        {
            var unit = units?[row] ?? 0;
            steps[row] = unit < 0 ? NoStep : next[unit]++;
        }

        var periods = ClassedRows.Of("file order", Keys(steps), row => (steps[row] + 1).ToString(CultureInfo.InvariantCulture));
        return new TimeAxis(null, [.. Enumerable.Range(0, rows).Select(row => (double)row)], periods, steps, null);
    }

    internal static TimeAxis Of(DateColumn column, Period? period)
    {
        if (period is not Period by)
        {
            return new TimeAxis(column, ColumnKeys.Of(column), ClassedRows.Of(column), null, $"{column.Name} holds dates: declare data.period (day, week, month, quarter or year), the step to count in");
        }

        long[] steps = [.. column.Days.Select(day => day == DateColumn.Missing ? NoStep : PeriodIndex.Of(by, day))];
        return new TimeAxis(column, ColumnKeys.Of(column), ClassedRows.Of(column.Name, Keys(steps), row => PeriodIndex.Label(by, column.Days[row])), steps, null);
    }

    /// <summary>Numbers step by 1, so they can be counted when all are whole.</summary>
    internal static TimeAxis Of(NumberColumn column)
    {
        var values = column.Values.ToArray();
        var broken = Array.FindIndex(values, value => !double.IsNaN(value) && !(double.IsInteger(value) && Math.Abs(value) <= LargestWhole));
        return broken >= 0
            ? new TimeAxis(column, values, ClassedRows.Of(column), null, string.Create(
                CultureInfo.InvariantCulture,
                $"{column.Name} has {column.Text(broken)} in row {broken + 1}, and time as a number steps by 1: number the periods with whole numbers, or use dates and data.period"))
            : new TimeAxis(column, values, ClassedRows.Of(column), [.. values.Select(value => double.IsNaN(value) ? NoStep : (long)value)], null);
    }

    private static double[] Keys(long[] steps) => [.. steps.Select(step => step == NoStep ? double.NaN : step)];
}
