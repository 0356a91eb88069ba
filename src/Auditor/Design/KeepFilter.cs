using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>The rows that the filter leaves, 0-based and rising, at least one.</summary>
/// <param name="Notes">Values asked for that no row has.</param>
public sealed record KeptRows(RowSubset Rows, IReadOnlyList<BindingNote> Notes);

/// <summary>
/// The declared row filter: every condition must hold, and a missing value meets none. Values are compared numerically on a number column, by day on a
/// date column, else as text; from and to are included and need numbers, dates, or levels that are all numbers.
/// </summary>
public static class KeepFilter
{
    /// <param name="file">The declaration, for messages.</param>
    public static Reading<KeptRows> Apply(DataTable table, IReadOnlyList<KeepCondition> conditions, string file)
    {
        List<Problem> problems = [.. conditions.SelectMany(condition =>
            Faults(table[condition.Column], condition).Select(fault => new Problem(file, condition.Line, "data.keep: " + fault)))];
        if (problems.Count > 0)
        {
            return Reading<KeptRows>.Failed(problems);
        }

        var tests = conditions.Select(condition => Test(table[condition.Column], condition)).ToList();
        var rows = Kept(table.RowCount, tests);
        return rows.Count > 0
            ? Reading<KeptRows>.Of(new KeptRows(rows, [.. conditions.SelectMany(condition => Absent(table, condition)).Distinct()]))
            : Reading<KeptRows>.Failed(new Problem(file, conditions.Count > 0 ? conditions[0].Line : null, "data.keep: no row meets every condition"));
    }

    private static RowSubset Kept(int tableRows, List<Func<int, bool>> tests)
    {
        if (tests.Count == 0)
        {
            return RowSubset.All(tableRows);
        }

        var kept = new RowBits(tableRows);
        for (var row = 0; row < tableRows; row++)
        {
            if (tests.TrueForAll(test => test(row)))
            {
                kept.Set(row);
            }
        }

        return new RowSubset(kept);
    }

    private static IEnumerable<string> Faults(DataColumn column, KeepCondition condition)
    {
        if (condition.Test != KeepTest.Between)
        {
            return condition.Values.Select(value => CellTest.Fault(column, value)).OfType<string>();
        }

        var range = Range(column);
        return range is null
            ? [$"from and to need numbers or dates, column {column.Name} has cells that are neither"]
            : Limits(condition).Select(limit => CellTest.Fault(range, limit)).OfType<string>();
    }

    /// <summary>The column as one that has an order: levels that are all numbers become numbers.</summary>
    private static DataColumn? Range(DataColumn column)
    {
        if (column is not LevelsColumn levels)
        {
            return column is TextColumn ? null : column;
        }

        var values = levels.Texts.Select(text => CellText.TryNumber(text, out var value) ? value : double.NaN).ToList();
        return values.Any(double.IsNaN)
            ? null
            : new NumberColumn(column.Name, [.. levels.Codes.Select(code => code < 0 ? double.NaN : values[code])]);
    }

    private static IEnumerable<string> Limits(KeepCondition condition) => new[] { condition.From, condition.To }.OfType<string>();

    private static Func<int, bool> Test(DataColumn column, KeepCondition condition)
    {
        if (condition.Test == KeepTest.Present)
        {
            return row => !column.IsMissing(row);
        }

        if (condition.Test == KeepTest.Between)
        {
            return Between(Range(column)!, condition);
        }

        var equal = condition.Values.Select(value => CellTest.Equal(column, value)).ToList();
        return condition.Test == KeepTest.Not
            ? row => !column.IsMissing(row) && !equal.Exists(test => test(row))
            : row => !column.IsMissing(row) && equal.Exists(test => test(row));
    }

    private static Func<int, bool> Between(DataColumn column, KeepCondition condition)
    {
        var position = CellTest.Position(column)!;
        var from = condition.From is { } lower ? CellTest.PositionOf(column, lower) : double.NegativeInfinity;
        var to = condition.To is { } upper ? CellTest.PositionOf(column, upper) : double.PositiveInfinity;
        return row => position(row) is var at && at >= from && at <= to;
    }

    private static IEnumerable<BindingNote> Absent(DataTable table, KeepCondition condition)
    {
        var column = table[condition.Column];
        return condition.Values
            .Where(value => CellTest.Equal(column, value) is var equal && !Enumerable.Range(0, table.RowCount).Any(equal))
            .Select(value => new ValueWithoutRows(condition.Column, value));
    }
}
