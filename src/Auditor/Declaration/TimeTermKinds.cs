using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Kinds of terms about dates and the order of rows.</summary>
internal static class TimeTermKinds
{
    private const int MostPeriods = 1_000_000;

    public static IReadOnlyList<(string Name, TermKind Read)> All { get; } =
    [
        ("step", Step),
        ("pulse", Pulse),
        ("season", Season),
        ("trend", (reader, argument) => reader.ReadColumn(argument) is { } column ? new TrendTerm(column) : null),
        ("lag", (reader, argument) => InTimeOrder(TimeOrderOperation.Lag, "by", 1, reader, argument)),
        ("change", (reader, argument) => InTimeOrder(TimeOrderOperation.Change, "by", 1, reader, argument)),
        ("moving_average", (reader, argument) => InTimeOrder(TimeOrderOperation.MovingAverage, "over", 2, reader, argument)),
    ];

    private static StepTerm? Step(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "from") is not { } keys)
        {
            return null;
        }

        var of = Column(keys, reader);
        var from = Point(keys, "from");
        return of is null || from is null ? null : new StepTerm(of, from.Text);
    }

    private static PulseTerm? Pulse(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "from", "to") is not { } keys)
        {
            return null;
        }

        var of = Column(keys, reader);
        var from = Point(keys, "from");
        var to = Point(keys, "to");
        return from is not null && to is not null && DateOrNumber.InOrder(from, to, keys) && of is not null
            ? new PulseTerm(of, from.Text, to.Text)
            : null;
    }

    private static SeasonTerm? Season(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "by") is not { } keys)
        {
            return null;
        }

        var of = Column(keys, reader);
        var by = keys.Required("by", "quarter or month")?.OneOf(("quarter", Period.Quarter), ("month", Period.Month));
        return of is null || by is not Period period ? null : new SeasonTerm(of, period);
    }

    private static TimeOrderTerm? InTimeOrder(TimeOrderOperation operation, string key, int least, TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", key) is not { } keys)
        {
            return null;
        }

        var of = keys.Required("of", "a column or a term that yields one number") is { } term
            ? reader.ReadOneColumn(term, TermWords.Name(operation))
            : null;
        var steps = keys.Required(key, "a number of periods")?.Whole(least, MostPeriods);
        return of is null || steps is not int count ? null : new TimeOrderTerm(operation, of, count);
    }

    private static ColumnTerm? Column(Keys keys, TermReader reader) =>
        keys.Required("of", "a column name") is { } column ? reader.ReadColumn(column) : null;

    private static DateOrNumber? Point(Keys keys, string key) =>
        keys.Required(key, "a date as YYYY-MM-DD or a number") is { } point ? DateOrNumber.Read(point) : null;
}
