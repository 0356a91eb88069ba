using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The keys under <c>data</c> that say how rows depend on each other.</summary>
internal sealed class StructureReader(ColumnNames columns)
{
    private const int LongestLag = 1_000_000;

    private const string ByEachValue = " (to divide the rows by each value of a column, use data.segments)";

    public StructureDeclaration Read(Keys data)
    {
        var time = data.Optional("time");
        var fileOrder = time is { Node: MapValue } && FileOrder(time);
        var structure = new StructureDeclaration(
            time is { Node: not MapValue } ? columns.Read(time, "data.time") : null,
            fileOrder,
            data.Optional("period")?.OneOf(Periods),
            Column(data, "unit"),
            data.Optional("serial_lag")?.Whole(0, LongestLag),
            data.Optional("split") is { } split ? Split(split) : null,
            Column(data, "cluster"),
            data.Optional("segments") is { } segments ? Segments(segments) : [])
        {
            TimeLine = time?.Line,
            PeriodLine = data.Optional("period")?.Line,
            SerialLagLine = data.Optional("serial_lag")?.Line,
        };
        RequireTime(data, time, fileOrder);
        return structure;
    }

    private static readonly IReadOnlyList<(string, Period)> Periods =
        [("day", Period.Day), ("week", Period.Week), ("month", Period.Month), ("quarter", Period.Quarter), ("year", Period.Year)];

    private ColumnMention? Column(Keys data, string key) => data.Optional(key) is { } place ? columns.Read(place, "data." + key) : null;

    private static bool FileOrder(Place place)
    {
        if (Keys.Of(place, "file_order")?.Required("file_order", "a column name or {file_order: true}") is not { } order)
        {
            return false;
        }

        if (order.Node is TextValue { Text: "true" })
        {
            return true;
        }

        order.Refuse("true");
        return false;
    }

    /// <summary>An order is what periods and serial lags are about; without it they would be read and ignored.</summary>
    private static void RequireTime(Keys data, Place? time, bool fileOrder)
    {
        foreach (var key in time is null ? data.Present("period", "serial_lag") : [])
        {
            data.Optional(key)!.Add("needs data.time, the order of the rows");
        }

        if (fileOrder && data.Optional("period") is { } period)
        {
            period.Add("needs a date column under data.time; the file's own order has no periods");
        }
    }

    private SplitDeclaration? Split(Place place)
    {
        if (Keys.Of(place, "column", "at", "row") is not { } keys)
        {
            return null;
        }

        switch (keys.Present("column", "at", "row"))
        {
            case ["row"]:
                return new SplitDeclaration(null, null, keys.Optional("row")!.Whole(1, int.MaxValue), place.Line);
            case ["column", "at"]:
                var column = columns.Read(keys.Optional("column")!, "data.split");
                var at = DateOrNumber.Read(keys.Optional("at")!, ByEachValue);
                return new SplitDeclaration(column?.Column, at?.Text, null, place.Line);
            default:
                if (keys.Optional("column") is { } named)
                {
                    columns.Read(named, "data.split");
                }

                keys.RefuseChoice("column and at, or row" + (keys.Has("row") ? "" : ByEachValue), ["column", "at", "row"]);
                return null;
        }
    }

    private List<ColumnMention> Segments(Place place)
    {
        var mentions = new List<ColumnMention>();
        var named = place.Node is TextValue && !place.IsNothing ? [place] : place.Items("column names");
        Distinct.Texts(named ?? [], "column", item =>
        {
            var mention = columns.Read(item, "data.segments");
            if (mention is not null && mentions.TrueForAll(other => other.Column != mention.Column))
            {
                mentions.Add(mention);
            }

            return mention?.Column;
        });
        return mentions;
    }
}
