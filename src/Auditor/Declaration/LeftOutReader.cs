using System.Globalization;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>left_out</c>.</summary>
internal static class LeftOutReader
{
    /// <summary>The groups whose names could be read, with those of their terms that could.</summary>
    public static IReadOnlyList<LeftOutGroup> Read(Place place, ColumnNames columns)
    {
        var items = place.Items("groups") ?? [];
        LeftOutGroup[] groups = [.. items.Select((item, index) => Group(item, index + 1, columns)).OfType<LeftOutGroup>()];
        foreach (var same in groups.GroupBy(group => group.Name, StringComparer.Ordinal))
        {
            foreach (var again in same.Skip(1))
            {
                place.Problems.Add(again.Line, "left_out: " + Distinct.Twice("group", again.Name, same.First().Line));
            }
        }

        return groups;
    }

    /// <summary>How a group is named in messages and mentions.</summary>
    public static string Where(string group) => $"left_out \"{Words.Short(group)}\"";

    private static LeftOutGroup? Group(Place item, int number, ColumnNames columns)
    {
        var place = item with { Path = Path(item, number) };
        if (Keys.Of(place, "group", "terms", "because", "reported") is not { } keys)
        {
            return null;
        }

        var name = keys.Required("group", "the name of the group")?.Text("the name of the group");
        var terms = keys.Required("terms", "a list of terms")?.Items("terms", least: 1) ?? [];
        var read = terms.Select(new TermReader(columns, place.Path).Read).OfType<Term>().ToList();
        var because = keys.Optional("because")?.Text();
        var reported = keys.Optional("reported") is { } printed ? ReportedReader.Test(printed) : null;
        return name is null ? null : new LeftOutGroup(name, read, because, reported, place.Line);
    }

    private static string Path(Place item, int number) =>
        item.Node is MapValue map && map.Entries.FirstOrDefault(entry => entry.Key == "group")?.Value is TextValue { Text.Length: > 0 } name
            ? Where(name.Text)
            : string.Create(CultureInfo.InvariantCulture, $"left_out, group {number}");
}
