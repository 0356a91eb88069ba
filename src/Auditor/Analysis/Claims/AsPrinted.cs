using System.Globalization;
using Auditor.Declaration;

namespace Auditor.Analysis.Claims;

/// <summary>A number written as the report writes its figure: as many decimals, with the exponent or per cent sign it has.</summary>
internal static class AsPrinted
{
    private const int BoundDigits = 3;
    private const int MostDecimals = 60;

    public static string Of(PrintedNumber like, double number)
    {
        if (like.Relation != PrintedRelation.Rounded)
        {
            return PlainNumber.Digits(number, BoundDigits);
        }

        var shown = like.Percent ? number * 100 : number;
        var decimals = Math.Clamp(-(like.Exponent + (like.Percent ? 2 : 0)), 0, MostDecimals);
        var text = like.Scientific || Math.Abs(shown) >= 1e15
            ? Scientific(like, shown)
            : shown.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return like.Percent ? text + " %" : text;
    }

    private static string Scientific(PrintedNumber like, double number)
    {
        var decimals = Math.Max(0, like.Digits.ToString(CultureInfo.InvariantCulture).Length - 1);
        return number.ToString("0." + new string('0', decimals) + "e+00", CultureInfo.InvariantCulture);
    }
}
