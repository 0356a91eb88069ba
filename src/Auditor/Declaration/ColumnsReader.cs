using Auditor.Data;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>data.columns</c>: kinds and levels that cannot be inferred.</summary>
internal static class ColumnsReader
{
    private static readonly IReadOnlyList<string> Known = ["kind", "reference", "levels"];

    public static IReadOnlyDictionary<string, ColumnDeclaration> Read(Place place, ColumnNames columns)
    {
        var declared = new Dictionary<string, ColumnDeclaration>(StringComparer.Ordinal);
        if (place.Node is not MapValue map)
        {
            if (!place.IsNothing)
            {
                place.Refuse("a map from column names to kinds");
            }

            return declared;
        }

        foreach (var entry in map.Entries)
        {
            if (Column(entry, place, columns) is { } column)
            {
                declared.Add(entry.Key, column);
            }
        }

        return declared;
    }

    private static ColumnDeclaration? Column(MapEntry entry, Place all, ColumnNames columns)
    {
        var name = all with { Node = new TextValue(entry.Key, IsPlain: false, entry.Line) };
        var mention = columns.Read(name, "data.columns");
        var place = all with { Node = entry.Value, Path = all.Path + "." + entry.Key };
        if (Keys.Of(place, Known) is not { } keys)
        {
            return null;
        }

        if (keys.Present(Known) is [])
        {
            keys.RefuseChoice("kind, reference or levels", Known);
        }

        var kind = keys.Optional("kind")
            ?.OneOf(("number", ColumnKind.Number), ("levels", ColumnKind.Levels), ("date", ColumnKind.Date), ("text", ColumnKind.Text));
        var reference = keys.Optional("reference")?.Text("a level");
        var levels = keys.Optional("levels")?.Items("levels", least: 1) is { } items ? Distinct.Texts(items, "level", item => item.Text("a level")) : null;
        CheckLevels(keys, kind, reference, levels);
        return mention is null ? null : new ColumnDeclaration(mention.Column, kind ?? Implied(keys), reference, levels, entry.Line);
    }

    /// <summary>Only levels have a reference.</summary>
    private static ColumnKind? Implied(Keys keys) => keys.Has("reference") || keys.Has("levels") ? ColumnKind.Levels : null;

    private static void CheckLevels(Keys keys, ColumnKind? kind, string? reference, IReadOnlyList<string>? levels)
    {
        if (kind is not (null or ColumnKind.Levels))
        {
            foreach (var key in keys.Present("reference", "levels"))
            {
                keys.Optional(key)!.Add("belongs to a column of kind levels only");
            }
        }

        if (reference is not null && levels?.Contains(reference) == false)
        {
            keys.Optional("reference")!.Add($"'{Words.Short(reference)}' is not one of the levels{NearestName.Hint(reference, levels)}");
        }
    }
}
