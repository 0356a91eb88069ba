namespace Auditor.Reporting.Html;

/// <summary>One value as a page shows it. A value that is missing always carries the reason.</summary>
/// <param name="Full">All digits, for the title; null when the text is the whole value.</param>
/// <param name="Kind">number, text or name: how it is set.</param>
/// <param name="Why">The reason, when there is no value.</param>
internal sealed record Cell(string Text, string? Full, string Kind, string? Why)
{
    private const string NoReason = "the record gives no reason";

    /// <summary>Letter of the note below the table that holds the reason.</summary>
    public string? Note { get; init; }

    /// <summary>Anchor on the page that says more.</summary>
    public string? Link { get; init; }

    public static Cell Words(string text) => new(text, null, "text", null);

    public static Cell Name(string? text, string? why = null) => text is null ? Missing(why) : new(text, null, "name", null);

    public static Cell Missing(string? why) => new("none", null, "missing", string.IsNullOrEmpty(why) ? NoReason : why);

    public static Cell Number(double? value, string? why = null) => Of(value, why, NumberText.Number);

    public static Cell Tenths(double? value, string? why = null) => Of(value, why, NumberText.Tenths);

    /// <summary>A share of variation: three significant digits.</summary>
    public static Cell Share(double? value, string? why = null) => Of(value, why, NumberText.Share);

    public static Cell Count(double? value, string? why = null) => Of(value, why, NumberText.Count);

    public static Cell Trusted(double? value, double? digits, string? why = null) =>
        Of(value, why, number => NumberText.Trusted(number, digits));

    public static Cell Probability(double? p, double? log10, double level, string? why = null) =>
        Of(p, why, number => NumberText.Probability(number, log10, level)) with
        {
            Full = p is null ? null : p == 0 && log10 is double power ? "10^" + NumberText.Full(power) : NumberText.Full(p.Value),
        };

    /// <summary>"2 and 2 386": numerator and denominator degrees of freedom, or the one there is.</summary>
    public static Cell Df(double? df1, double? df2, string? why = null) => (df1, df2) switch
    {
        (double first, double second) => new($"{NumberText.Count(first)} and {NumberText.Count(second)}", null, "number", null),
        (double only, null) => Count(only),
        _ => Missing(why),
    };

    public static Cell Range(double? lower, double? upper, string? why, Func<double, string> text) =>
        lower is double from && upper is double to
            ? new($"{text(from)} to {text(to)}", $"{NumberText.Full(from)} to {NumberText.Full(to)}", "number", null)
            : Missing(why);

    private static Cell Of(double? value, string? why, Func<double, string> text) =>
        value is double number ? new(text(number), NumberText.Full(number), "number", null) : Missing(why);
}

/// <summary>A named value outside a table, and what it means.</summary>
internal sealed record Fact(string Label, Cell Cell, string? Meaning = null);

/// <summary>Values outside a table; the missing ones are gathered by their reason.</summary>
/// <param name="Missing">Label: the names, separated; cell: the reason.</param>
internal sealed record FactList(IReadOnlyList<Fact> Present, IReadOnlyList<Fact> Missing)
{
    public static FactList Of(params IReadOnlyList<Fact> facts) => new(
        [.. facts.Where(fact => fact.Cell.Why is null)],
        Gathered(facts.Where(fact => fact.Cell.Why is not null).Select(fact => (fact.Label, fact.Cell.Why!))));

    /// <summary>One fact a reason, in the order of first mention.</summary>
    public static IReadOnlyList<Fact> Gathered(IEnumerable<(string Label, string Why)> missing) =>
        [.. missing.GroupBy(item => item.Why, item => item.Label).Select(group => new Fact(string.Join("; ", group), Cell.Words(group.Key)))];
}
