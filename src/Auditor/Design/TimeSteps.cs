using System.Globalization;

namespace Auditor.Design;

/// <summary>The rows of a table by unit and period, for terms that look at earlier periods of the same unit: one row for each period of a unit, or it cannot be.</summary>
internal sealed class TimeSteps
{
    private const int MostShown = 5;

    private readonly int _tableRows;
    private readonly (int Unit, long Step, int Row)[] _rows;

    private TimeSteps(int tableRows, (int Unit, long Step, int Row)[] rows, IReadOnlyList<string> problems) =>
        (_tableRows, _rows, Problems) = (tableRows, rows, problems);

    /// <summary>Why there is no such order; it can be used when there are none.</summary>
    public IReadOnlyList<string> Problems { get; }

    /// <param name="steps">The number of each row's period.</param>
    /// <param name="units">Its unit; null for one series.</param>
    /// <param name="period">What to call a row's period.</param>
    public static TimeSteps Of(long[] steps, ClassedRows? units, Func<int, string> period)
    {
        var rows = Enumerable.Range(0, steps.Length)
            .Select(row => (Unit: units?[row] ?? 0, Step: steps[row], Row: row))
            .Where(place => place.Unit >= 0 && place.Step != TimeAxis.NoStep)
            .ToArray();
        Array.Sort(rows);
        var twice = rows.Zip(rows.Skip(1)).Where(pair => pair.First.Unit == pair.Second.Unit && pair.First.Step == pair.Second.Step).ToList();
        List<string> problems = [.. twice.Take(MostShown).Select(pair => Same(pair.First.Row, pair.Second.Row, units, period))];
        if (twice.Count > MostShown)
        {
            problems.Add(string.Create(CultureInfo.InvariantCulture, $"{twice.Count - MostShown} more pairs of rows like these"));
        }

        return new TimeSteps(steps.Length, rows, problems);
    }

    /// <summary>For each row of the table the row some periods earlier in its unit; -1 where there is none.</summary>
    public int[] Earlier(int periods)
    {
        var (earlier, at) = (NoRows(), 0);
        foreach (var (unit, step, row) in _rows)
        {
            var sought = (unit, step - periods);
            while ((_rows[at].Unit, _rows[at].Step).CompareTo(sought) < 0)
            {
                at++;
            }

            earlier[row] = (_rows[at].Unit, _rows[at].Step) == sought ? _rows[at].Row : -1;
        }

        return earlier;
    }

    /// <summary>For each row of the table its own period and the ones just before it in its unit.</summary>
    /// <param name="periods">How many, its own included.</param>
    public TimeWindows Windows(int periods)
    {
        var ends = NoRows();
        for (var at = periods - 1; at < _rows.Length; at++)
        {
            var (first, last) = (_rows[at - periods + 1], _rows[at]);
            if (first.Unit == last.Unit && first.Step == last.Step - periods + 1)
            {
                ends[last.Row] = at;
            }
        }

        return new TimeWindows([.. _rows.Select(place => place.Row)], ends, periods);
    }

    private static string Same(int first, int second, ClassedRows? units, Func<int, string> period)
    {
        var unit = units is null ? "" : $" of {units.Name} {units.Label(units[first])}";
        return string.Create(CultureInfo.InvariantCulture, $"rows {first + 1} and {second + 1} both lie in {period(first)}{unit}")
            + "; lag, change and moving_average need one row for each period" + (units is null ? " (or is data.unit missing?)" : " of a unit");
    }

    private int[] NoRows()
    {
        var rows = new int[_tableRows];
        Array.Fill(rows, -1);
        return rows;
    }
}

/// <summary>Neighbouring periods of one unit, ending at a row.</summary>
/// <param name="rows">Rows of the table by unit and period.</param>
/// <param name="ends">For each row of the table its place among <paramref name="rows"/>; -1 where a period of its window is not there.</param>
internal sealed class TimeWindows(int[] rows, int[] ends, int periods)
{
    public bool IsWhole(int row) => ends[row] >= 0;

    public bool Any(int row, Func<int, bool> test)
    {
        var found = false;
        for (var back = 0; back < periods && !found; back++)
        {
            found = test(rows[ends[row] - back]);
        }

        return found;
    }

    /// <summary>The plain mean, summed from the earliest period on; not finite when a value is not.</summary>
    public double Mean(int row, double[] values)
    {
        double sum = 0;
        for (var back = periods - 1; back >= 0; back--)
        {
            sum += values[rows[ends[row] - back]];
        }

        return sum / periods;
    }
}
