using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Kinds of terms that make one number of numbers in the same row.</summary>
internal static class NumberTermKinds
{
    public static IReadOnlyList<(string Name, TermKind Read)> All { get; } =
    [
        .. Enum.GetValues<NumberTransform>().Select(transform =>
            (TermWords.Name(transform), (TermKind)((reader, argument) => Transform(transform, reader, argument)))),
        ("power", Power),
        ("ratio", (reader, argument) => Pair(reader, argument, "ratio") is [var above, var below] ? new RatioTerm(above, below) : null),
        ("minus", (reader, argument) => Pair(reader, argument, "minus") is [var left, var right] ? new MinusTerm(left, right) : null),
        ("winsorise", Winsorise),
        ("cap", Cap),
    ];

    /// <summary>Either the term itself or a map with <c>of</c> and <c>plus</c>; a map with one other key is a term.</summary>
    private static TransformTerm? Transform(NumberTransform transform, TermReader reader, Place argument)
    {
        var name = TermWords.Name(transform);
        if (argument.Node is not MapValue map || map.Entries is [{ Key: not ("of" or "plus") }])
        {
            return reader.ReadOneColumn(argument, name) is { } term ? new TransformTerm(transform, term) : null;
        }

        // Adding a number before taking the mean away would change nothing.
        if (Keys.Of(argument, transform == NumberTransform.Center ? ["of"] : ["of", "plus"]) is not { } keys)
        {
            return null;
        }

        var of = Of(keys, reader, name);
        var plus = keys.Optional("plus") is { } added ? added.Number() : 0;
        return of is null || plus is not double shift ? null : new TransformTerm(transform, of, shift);
    }

    private static PowerTerm? Power(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "exponent") is not { } keys)
        {
            return null;
        }

        const string Expected = "a number other than 0";
        var of = Of(keys, reader, "power");
        var exponent = keys.Required("exponent", Expected)?.Number(Expected, value => value != 0);
        return of is null || exponent is not double raised ? null : new PowerTerm(of, raised);
    }

    private static IReadOnlyList<Term> Pair(TermReader reader, Place argument, string name)
    {
        if (argument.Node is not ListValue { Items.Count: 2 } || argument.Items("terms") is not { } items)
        {
            argument.Add("expected a list of two terms, found " + (argument.Node is ListValue list ? list.Items.Count : Words.Found(argument.Node)));
            return [];
        }

        return [.. items.Select(item => reader.ReadOneColumn(item, name)).OfType<Term>()];
    }

    private static WinsoriseTerm? Winsorise(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "lower", "upper") is not { } keys)
        {
            return null;
        }

        const string Expected = "a quantile from 0 to 1";
        var of = Of(keys, reader, "winsorise");
        var lower = keys.Required("lower", Expected)?.Number(Expected, IsShare);
        var upper = keys.Required("upper", Expected)?.Number(Expected, IsShare);
        return Ascending(keys, lower, upper) && of is not null && lower is double from && upper is double to ? new WinsoriseTerm(of, from, to) : null;
    }

    private static bool IsShare(double value) => value is >= 0 and <= 1;

    private static CapTerm? Cap(TermReader reader, Place argument)
    {
        if (Keys.Of(argument, "of", "lower", "upper") is not { } keys)
        {
            return null;
        }

        var of = Of(keys, reader, "cap");
        var lower = keys.Optional("lower")?.Number();
        var upper = keys.Optional("upper")?.Number();
        if (keys.Present("lower", "upper") is [])
        {
            keys.Add("expected lower, upper or both");
        }

        return Ascending(keys, lower, upper) && of is not null ? new CapTerm(of, lower, upper) : null;
    }

    private static bool Ascending(Keys keys, double? lower, double? upper)
    {
        if (lower >= upper)
        {
            keys.Add($"expected lower below upper, found {TermWords.Limit(lower)} and {TermWords.Limit(upper)}");
            return false;
        }

        return true;
    }

    private static Term? Of(Keys keys, TermReader reader, string name) =>
        keys.Required("of", "a column or a term that yields one number") is { } term ? reader.ReadOneColumn(term, name) : null;
}
