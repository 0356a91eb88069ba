using System.Globalization;
using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>Binds terms about dates, or numbers that stand for time.</summary>
internal static class TimeBinding
{
    public static BoundTerm? Step(BindingScope scope, StepTerm term) =>
        Position(scope, term, term.Of, [term.From]) is var (position, limits)
            ? new BoundCell(term, scope[term.Of], row => position(row) >= limits[0] ? 1 : 0)
            : null;

    public static BoundTerm? Pulse(BindingScope scope, PulseTerm term) =>
        Position(scope, term, term.Of, [term.From, term.To]) is var (position, limits)
            ? new BoundCell(term, scope[term.Of], row => position(row) is var at && at >= limits[0] && at <= limits[1] ? 1 : 0)
            : null;

    /// <summary>The seasons that kept rows have, the lowest of them the reference.</summary>
    public static BoundTerm? Season(BindingScope scope, SeasonTerm term)
    {
        if (scope[term.Of] is not DateColumn dates)
        {
            return scope.Refuse(term, $"{term.Label}: {term.Of.Column} does not hold dates");
        }

        var seasons = KeptDays(scope, dates).Select(day => PeriodIndex.SeasonOf(term.By, day)).Distinct().Order().ToList();
        if (seasons is [var only])
        {
            scope.Note(new SingleLevel(term.Label, only.ToString(CultureInfo.InvariantCulture)));
        }

        IReadOnlyList<string> labels = [.. seasons.Skip(1).Select(season => string.Create(CultureInfo.InvariantCulture, $"{term.Label} = {season}"))];
        return seasons.Count == 0
            ? scope.Refuse(term, NoValue(term))
            : new BoundDummies(term, dates, labels, row => dates.IsMissing(row) ? -1 : seasons.IndexOf(PeriodIndex.SeasonOf(term.By, dates.Days[row])) - 1);
    }

    /// <summary>Periods since the earliest kept date, counted as calendar periods: two days of one month are no month apart, wherever in the month they lie.</summary>
    public static BoundTerm? Trend(BindingScope scope, TrendTerm term) => scope[term.Of] switch
    {
        NumberColumn numbers => Since(scope, term, numbers, [.. scope.KeptRows.Select(row => numbers.Values[row]).Where(double.IsFinite)], row => numbers.Values[row]),
        DateColumn dates => Since(scope, term, dates, [.. KeptDays(scope, dates).Select(day => Index(scope, day))], row => dates.IsMissing(row) ? double.NaN : Index(scope, dates.Days[row])),
        _ => scope.Refuse(term, $"{term.Label}: {term.Of.Column} holds neither dates nor numbers"),
    };

    private static BoundTerm? Since(BindingScope scope, TrendTerm term, DataColumn column, double[] kept, Func<int, double> value)
    {
        if (kept.Length == 0)
        {
            return scope.Refuse(term, NoValue(term));
        }

        var origin = kept.Min();
        return new BoundCell(term, column, row => value(row) - origin);
    }

    private static double Index(BindingScope scope, int day) => PeriodIndex.Of(scope.Period ?? Period.Day, day);

    private static IEnumerable<int> KeptDays(BindingScope scope, DateColumn dates) =>
        scope.KeptRows.Where(row => !dates.IsMissing(row)).Select(row => dates.Days[row]);

    private static string NoValue(Term term) => $"{term.Label}: no kept row has a value";

    private static (Func<int, double> Position, double[] Limits)? Position(BindingScope scope, Term term, ColumnTerm of, string[] limits)
    {
        var column = scope[of];
        var fault = CellTest.Position(column) is null
            ? $"{of.Column} holds neither dates nor numbers"
            : limits.Select(limit => CellTest.Fault(column, limit)).FirstOrDefault(found => found is not null);
        if (fault is null)
        {
            return (CellTest.Position(column)!, [.. limits.Select(limit => CellTest.PositionOf(column, limit))]);
        }

        scope.Refuse(term, $"{term.Label}: {fault}");
        return null;
    }
}
