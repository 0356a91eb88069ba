using System.Globalization;

namespace Auditor;

/// <summary>Numbers inside sentences that end up in the record: plain characters, few digits, never a p of 0, the same in every culture.</summary>
internal static class PlainNumber
{
    private const double Least = 1e-300;
    private const double Small = 1e-4;
    private const double Large = 1e9;

    public static string P(double p) => p < Least ? "below 1e-300" : Digits(p, 3);

    /// <summary>"p = 0.012", "p &lt; 0.0001": a sentence needs no more, and p must not seem to be on the other side of the level it was compared with.</summary>
    public static string PAgainst(double p, double level)
    {
        if (p < Small && level > Small)
        {
            return "p < 0.0001";
        }

        var digits = 3;
        while (digits < 12 && double.Parse(Digits(p, digits), NumberStyles.Float, CultureInfo.InvariantCulture) <= level != p <= level)
        {
            digits++;
        }

        return "p = " + (p < Least ? P(p) : Digits(p, digits));
    }

    public static string Count(double value) => value.ToString("#,0", CultureInfo.InvariantCulture);

    /// <summary>So many significant digits; beyond everyday sizes with an exponent.</summary>
    public static string Digits(double value, int digits)
    {
        if (value != 0 && (Math.Abs(value) < Small || Math.Abs(value) >= Large))
        {
            return value.ToString("0." + new string('#', digits - 1) + "e-0", CultureInfo.InvariantCulture);
        }

        var rounded = decimal.Parse(
            value.ToString("E" + (digits - 1).ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture),
            NumberStyles.Float,
            CultureInfo.InvariantCulture);
        return rounded.ToString("0.###########", CultureInfo.InvariantCulture);
    }
}
