using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>data.keep</c>: which rows stay.</summary>
internal sealed class KeepReader(ColumnNames columns)
{
    private const string Where = "data.keep";

    private static readonly IReadOnlyList<string> Tests = ["equals", "not", "in", "from", "to", "present"];

    public IReadOnlyList<KeepCondition> Read(Place place) =>
        [.. (place.Items("conditions") ?? []).Select(Condition).OfType<KeepCondition>()];

    private KeepCondition? Condition(Place place)
    {
        if (Keys.Of(place, ["column", .. Tests]) is not { } keys)
        {
            return null;
        }

        var column = keys.Required("column", "a column name") is { } named ? columns.Read(named, Where)?.Column : null;
        var test = Test(keys, keys.Present(Tests), column ?? "", place.Line);
        return column is null ? null : test;
    }

    private static KeepCondition? Test(Keys keys, IReadOnlyList<string> present, string column, int line)
    {
        KeepCondition? Of(KeepTest test, params IReadOnlyList<string>? values) =>
            values is null ? null : new KeepCondition(column, test, values, null, null, line);

        switch (present)
        {
            case ["equals"]:
                return Of(KeepTest.EqualTo, One(keys.Optional("equals")!));
            case ["not"]:
                return Of(KeepTest.Not, One(keys.Optional("not")!));
            case ["in"]:
                return Of(KeepTest.In, keys.Optional("in")!.List("texts", item => item.AnyText(), least: 1));
            case ["present"]:
                return Of(KeepTest.Present, True(keys.Optional("present")!) ? [] : null);
            case ["from", "to"] or ["from"] or ["to"]:
                return Between(keys, column, line);
            default:
                keys.RefuseChoice("exactly one of equals, not, in, from/to or present", Tests);
                return null;
        }
    }

    private static IReadOnlyList<string>? One(Place place) => place.AnyText() is { } text ? [text] : null;

    private static bool True(Place place)
    {
        if (place.Node is TextValue { Text: "true" })
        {
            return true;
        }

        place.Refuse("true");
        return false;
    }

    private static KeepCondition? Between(Keys keys, string column, int line)
    {
        var from = keys.Optional("from") is { } first ? DateOrNumber.Read(first) : null;
        var to = keys.Optional("to") is { } last ? DateOrNumber.Read(last) : null;
        if (from is not null && to is not null && !DateOrNumber.InOrder(from, to, keys))
        {
            return null;
        }

        return new KeepCondition(column, KeepTest.Between, [], from?.Text, to?.Text, line);
    }
}
