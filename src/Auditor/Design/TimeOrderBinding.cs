using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>
/// Binds lags, changes and moving averages: computed over every row that was read, before the filter, by period within unit. A moving average is that of the
/// row's own period and the ones just before it. A row or an earlier one that is not there, or has no value, leaves no value.
/// </summary>
internal static class TimeOrderBinding
{
    public static BoundTerm? Of(BindingScope scope, TimeOrderTerm term, BoundTerm of)
    {
        if (scope.Steps(term) is not { } steps)
        {
            return null;
        }

        var from = BuiltColumn.Of(of, scope.TableRows);
        return new BoundBuilt(term, term.Operation switch
        {
            TimeOrderOperation.Lag => Lag(term, from, steps.Earlier(term.Steps)),
            TimeOrderOperation.Change => Change(term, from, steps.Earlier(term.Steps)),
            _ => Average(term, from, steps.Windows(term.Steps)),
        });
    }

    private static BuiltColumn Lag(TimeOrderTerm term, BuiltColumn from, int[] earlier) => Built(
        term,
        from.Length,
        row => earlier[row] < 0 || from.IsMissing(earlier[row]),
        row => from.Values[earlier[row]]);

    private static BuiltColumn Change(TimeOrderTerm term, BuiltColumn from, int[] earlier) => Built(
        term,
        from.Length,
        row => earlier[row] < 0 || from.IsMissing(row) || from.IsMissing(earlier[row]),
        row => from.Values[row] - from.Values[earlier[row]]);

    private static BuiltColumn Average(TimeOrderTerm term, BuiltColumn from, TimeWindows windows) => Built(
        term,
        from.Length,
        row => !windows.IsWhole(row) || windows.Any(row, from.IsMissing),
        row => windows.Mean(row, from.Values));

    /// <param name="value">Not finite where what it is made of does not exist.</param>
    private static BuiltColumn Built(TimeOrderTerm term, int tableRows, Func<int, bool> isMissing, Func<int, double> value)
    {
        var (values, missing) = (new double[tableRows], new bool[tableRows]);
        for (var row = 0; row < tableRows; row++)
        {
            missing[row] = isMissing(row);
            values[row] = missing[row] ? double.NaN : value(row);
        }

        return new BuiltColumn(term.Label, values, missing);
    }
}
