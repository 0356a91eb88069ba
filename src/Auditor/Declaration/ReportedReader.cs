using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Figures as a report printed them: readable, kept as text. What could be read in two ways where it would matter is refused.</summary>
internal static class ReportedReader
{
    private const string Expected = "a figure such as 0.310, 41.3 %, 1e-05 or \"< 0.001\", without thousands marks";
    private const string ExpectedF = "a figure such as 2.13, 1e-05 or \"> 100\", without thousands marks or a per cent sign";
    private const string ExpectedCount = "a whole number such as 54000, without thousands marks";
    private const string ExpectedDf = "degrees of freedom such as 2, 54000 or 17.3, without thousands marks";

    public static ReportedTest? Test(Place place)
    {
        if (SomeOf(place, "f", "df", "p") is not { } keys)
        {
            return null;
        }

        return new ReportedTest(Optional(keys, "f", F), keys.Optional("df") is { } df ? Df(df) : [], Optional(keys, "p"));
    }

    public static ReportedFigures? Model(Place place)
    {
        if (SomeOf(place, "rows_used", "r_squared", "adjusted_r_squared", "residual_sd", "f", "coefficients") is not { } keys)
        {
            return null;
        }

        return new ReportedFigures(
            Optional(keys, "rows_used", Count),
            Optional(keys, "r_squared"),
            Optional(keys, "adjusted_r_squared"),
            Optional(keys, "residual_sd"),
            Optional(keys, "f", F),
            keys.Optional("coefficients") is { } coefficients ? Coefficients(coefficients) : []);
    }

    private static IReadOnlyList<ReportedCoefficient> Coefficients(Place place)
    {
        if (place.Node is MapValue map)
        {
            return [.. map.Entries.Select(entry => Coefficient(entry, place)).OfType<ReportedCoefficient>()];
        }

        place.Refuse("a map from coefficient labels to figures");
        return [];
    }

    private static ReportedCoefficient? Coefficient(MapEntry entry, Place all)
    {
        var place = all with { Node = entry.Value, Path = $"{all.Path}[{Words.Short(entry.Key)}]" };
        return SomeOf(place, "estimate", "standard_error", "p") is { } keys
            ? new ReportedCoefficient(entry.Key, Optional(keys, "estimate"), Optional(keys, "standard_error"), Optional(keys, "p"), entry.Line)
            : null;
    }

    /// <summary>A map with at least one of the keys.</summary>
    private static Keys? SomeOf(Place place, params IReadOnlyList<string> known)
    {
        if (Keys.Of(place, known) is not { } keys)
        {
            return null;
        }

        if (place.Node is MapValue { Entries.Count: 0 })
        {
            place.Add("expected at least one of " + string.Join(", ", known));
        }

        return keys;
    }

    /// <summary>One or two degrees of freedom.</summary>
    private static IReadOnlyList<ReportedFigure> Df(Place place)
    {
        if (place.Node is ListValue { Items.Count: 1 or 2 })
        {
            return [.. place.Items("figures")!.Select(Degrees).OfType<ReportedFigure>()];
        }

        place.Add("expected a list of one or two figures, found " + (place.Node is ListValue list ? list.Items.Count : Words.Found(place.Node)));
        return [];
    }

    private static ReportedFigure? Optional(Keys keys, string key) => Optional(keys, key, Any);

    private static ReportedFigure? Optional(Keys keys, string key, Func<Place, ReportedFigure?> read) => keys.Optional(key) is { } place ? read(place) : null;

    private static ReportedFigure? Any(Place place) => Figure(place, Expected, _ => true);

    private static ReportedFigure? F(Place place) => Figure(place, ExpectedF, number => !number.Percent);

    /// <summary>Nothing but digits: "54,000" and "54.000" would be 54 by the rule for decimals, and are hardly ever meant so.</summary>
    private static ReportedFigure? Count(Place place) => Figure(place, ExpectedCount, _ => place.Node is TextValue { Text: var text } && text.All(char.IsAsciiDigit));

    private static ReportedFigure? Degrees(Place place) =>
        Figure(place, ExpectedDf, number => number is { Relation: PrintedRelation.Rounded, Negative: false, Percent: false, MaybeThousands: false });

    private static ReportedFigure? Figure(Place place, string expected, Func<PrintedNumber, bool> holds)
    {
        if (place.Node is TextValue { Text: var text } && PrintedNumber.Read(text) is { } number && holds(number))
        {
            return new ReportedFigure(text, place.Line);
        }

        place.Refuse(expected);
        return null;
    }
}
