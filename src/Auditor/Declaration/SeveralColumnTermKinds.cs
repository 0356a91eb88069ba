using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Kinds of terms that may make several columns, and the indicator of one level.</summary>
internal static class SeveralColumnTermKinds
{
    /// <summary>Raw powers above this are rounding noise in double precision.</summary>
    private const int HighestDegree = 30;

    public static IReadOnlyList<(string Name, TermKind Read)> All { get; } =
    [
        ("product", Product),
        ("polynomial", Polynomial),
        ("spline", (reader, argument) => Cut(reader, argument, "spline", "knots", 3) is var (of, knots) ? new SplineTerm(of, knots) : null),
        ("bins", (reader, argument) => Cut(reader, argument, "bins", "cuts", 1) is var (of, cuts) ? new BinsTerm(of, cuts) : null),
        ("indicator", Indicator),
    ];

    private static ProductTerm? Product(TermReader reader, Place argument) =>
        argument.List("terms", reader.Read, least: 2) is { } factors ? new ProductTerm(factors) : null;

    private static PolynomialTerm? Polynomial(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "degree") is not { } keys)
        {
            return null;
        }

        var of = keys.Required("of", "a column or a term that yields one number") is { } term ? reader.ReadOneColumn(term, "polynomial") : null;
        var degree = keys.Required("degree", "a whole number")?.Whole(1, HighestDegree);
        return of is null || degree is not int highest ? null : new PolynomialTerm(of, highest);
    }

    /// <summary>A term cut at ascending points.</summary>
    private static (Term Of, IReadOnlyList<double> Points)? Cut(TermReader reader, Place argument, string name, string key, int least)
    {
        if (Keys.Of(argument, "of", key) is not { } keys)
        {
            return null;
        }

        var of = keys.Required("of", "a column or a term that yields one number") is { } term ? reader.ReadOneColumn(term, name) : null;
        var points = keys.Required(key, "a list of numbers") is { } list ? Ascending(list, least) : null;
        return of is null || points is null ? null : (of, points);
    }

    private static List<double>? Ascending(Place place, int least)
    {
        var points = place.Items("numbers", least)?.Select(item => item.Number()).ToList();
        if (points?.Contains(null) != false)
        {
            return null;
        }

        var numbers = points.Select(point => point!.Value).ToList();
        if (numbers.Zip(numbers.Skip(1)).All(pair => pair.First < pair.Second))
        {
            return numbers;
        }

        place.Add("expected numbers in rising order, none twice");
        return null;
    }

    private static IndicatorTerm? Indicator(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "equals") is not { } keys)
        {
            return null;
        }

        var of = keys.Required("of", "a column name") is { } column ? reader.ReadColumn(column) : null;
        var value = keys.Required("equals", "a text or number")?.AnyText();
        return of is null || value is null ? null : new IndicatorTerm(of, value);
    }
}
