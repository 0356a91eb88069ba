using System.Globalization;
using csFastFloat;

namespace Auditor.Data;

/// <summary>What the text of a cell or of a declared value means. White space around numbers and dates is let pass.</summary>
internal static class CellText
{
    private const NumberStyles NumberStyle = NumberStyles.Float;

    private const int MostDigits = 15;

    private static readonly double[] PowersOfTen = [1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15];

    /// <summary>A finite number: decimal point, exponent allowed, no thousands mark.</summary>
    public static bool TryNumber(ReadOnlySpan<char> text, out double value) => TryShortDecimal(text, out value) || TryAnyNumber(text, out value);

    /// <summary>
    /// Digits, with a minus before and a point among them if need be. With at most 15 digits both the digits as a whole number and the power of ten are exact in double
    /// precision, so their quotient is the nearest double (Clinger 1990, How to read floating point numbers accurately).
    /// </summary>
    private static bool TryShortDecimal(ReadOnlySpan<char> text, out double value)
    {
        value = 0;
        var negative = !text.IsEmpty && text[0] == '-';
        var digits = negative ? text[1..] : text;
        if (digits.Length is 0 or > MostDigits)
        {
            return false;
        }

        var (whole, point) = (0L, -1);
        for (var i = 0; i < digits.Length; i++)
        {
            var digit = (uint)(digits[i] - '0');
            if (digit <= 9)
            {
                whole = (10 * whole) + digit;
            }
            else if (digits[i] == '.' && point < 0 && i > 0 && i + 1 < digits.Length)
            {
                point = i;
            }
            else
            {
                return false;
            }
        }

        value = point < 0 ? whole : whole / PowersOfTen[digits.Length - point - 1];
        value = negative ? -value : value;
        return true;
    }

    private static bool TryAnyNumber(ReadOnlySpan<char> text, out double value)
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
