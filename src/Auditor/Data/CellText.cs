using System.Globalization;
using csFastFloat;

namespace Auditor.Data;

/// <summary>What the text of a cell or of a declared value means. White space around numbers and dates is let pass.</summary>
internal static class CellText
{
    private const NumberStyles NumberStyle = NumberStyles.Float;

    /// <summary>A finite number: decimal point, exponent allowed, no thousands mark.</summary>
    public static bool TryNumber(ReadOnlySpan<char> text, out double value)
    {
        // The fast parser stops at the first character it does not know and calls that a success ("26a" is 26): only a text read to its end counts.
        if (FastDoubleParser.TryParseDouble(text, out int used, out value) && used == text.Length && double.IsFinite(value))
        {
            return true;
        }

        // The parser of the platform takes "Infinity" and "NaN", turns 1e400 into infinity, and lets trailing null characters pass.
        return double.TryParse(text, NumberStyle, CultureInfo.InvariantCulture, out value) && double.IsFinite(value) && text[^1] != '\0';
    }

    /// <summary>A date as YYYY-MM-DD, as days since 0001-01-01.</summary>
    public static bool TryDay(ReadOnlySpan<char> text, out int day)
    {
        var read = DateOnly.TryParseExact(text.Trim(), "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out var date);
        day = date.DayNumber;
        return read;
    }

    /// <summary>The text as a message shows it: in quotation marks, on one line, not too long.</summary>
    public static string Shown(ReadOnlySpan<char> text)
    {
        const int most = 40;
        var start = text[..Math.Min(text.Length, most)].ToString();
        var oneLine = start.Replace("\r", "\\r", StringComparison.Ordinal).Replace("\n", "\\n", StringComparison.Ordinal).Replace("\t", "\\t", StringComparison.Ordinal);
        return "'" + oneLine + (text.Length > most ? "…" : string.Empty) + "'";
    }
}
