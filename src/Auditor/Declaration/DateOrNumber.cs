using System.Globalization;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>A point on a date or number column: a date as YYYY-MM-DD or a finite number.</summary>
/// <param name="Value">Days or the number, to put two points in order.</param>
internal sealed record DateOrNumber(string Text, bool IsDate, double Value)
{
    private const string Expected = "a date as YYYY-MM-DD or a number";

    /// <param name="hint">What to use where neither is meant, in brackets.</param>
    public static DateOrNumber? Read(Place place, string hint = "")
    {
        if (place.Node is not TextValue { Text: var text })
        {
            place.Refuse(Expected + hint);
            return null;
        }

        if (DateOnly.TryParseExact(text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out var date))
        {
            return new DateOrNumber(text, IsDate: true, date.DayNumber);
        }

        return place.Number(Expected + hint) is double number ? new DateOrNumber(text, IsDate: false, number) : null;
    }

    /// <summary>Adds a problem unless both are dates or both numbers, and in order.</summary>
    public static bool InOrder(DateOrNumber from, DateOrNumber to, Keys keys)
    {
        if (from.IsDate == to.IsDate && from.Value <= to.Value)
        {
            return true;
        }

        keys.Add($"expected two dates or two numbers, 'from' not after 'to', found '{from.Text}' and '{to.Text}'");
        return false;
    }
}
