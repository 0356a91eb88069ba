using System.Text.RegularExpressions;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Figures as a report printed them: held against a pattern, kept as text.</summary>
internal static partial class ReportedReader
{
    private const string Expected = "a figure such as 0.310, 1e-05 or \"< 0.001\"";

    public static ReportedTest? Test(Place place)
    {
        if (SomeOf(place, "f", "df", "p") is not { } keys)
        {
            return null;
        }

        return new ReportedTest(Optional(keys, "f"), keys.Optional("df") is { } df ? Df(df) : [], Optional(keys, "p"));
    }

    public static ReportedFigures? Model(Place place)
    {
        if (SomeOf(place, "rows_used", "r_squared", "adjusted_r_squared", "residual_sd", "f", "coefficients") is not { } keys)
        {
            return null;
        }

        return new ReportedFigures(
            Optional(keys, "rows_used"),
            Optional(keys, "r_squared"),
            Optional(keys, "adjusted_r_squared"),
            Optional(keys, "residual_sd"),
            Optional(keys, "f"),
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
            return [.. place.Items("figures")!.Select(Figure).OfType<ReportedFigure>()];
        }

        place.Add("expected a list of one or two figures, found " + (place.Node is ListValue list ? list.Items.Count : Words.Found(place.Node)));
        return [];
    }

    private static ReportedFigure? Optional(Keys keys, string key) => keys.Optional(key) is { } place ? Figure(place) : null;

    private static ReportedFigure? Figure(Place place)
    {
        if (place.Node is TextValue { Text: var text } && Printed().IsMatch(text))
        {
            return new ReportedFigure(text, place.Line);
        }

        place.Refuse(Expected);
        return null;
    }

    /// <summary>A decimal number, with or without an exponent, or a bound.</summary>
    [GeneratedRegex(@"\A(?:(?:<|<=|≤|>|>=|≥) ?)?[+-]?(?:[0-9]+(?:\.[0-9]*)?|\.[0-9]+)(?:[eE][+-]?[0-9]+)?\z", RegexOptions.CultureInvariant)]
    private static partial Regex Printed();
}
