using System.Globalization;

namespace Auditor;

/// <summary>
/// Numbers as people write them, the same in sentences, tables, pictures and on the terminal, in every culture: a comma between thousands, a decimal point, a power of ten
/// beyond everyday sizes, and a p below 0.0001 as no more than that, unless the level it is compared with is smaller still.
/// </summary>
internal static class PlainNumber
{
    /// <summary>Significant digits of a statistic or an estimate.</summary>
    public const int UsualDigits = 4;

    /// <summary>Significant digits of a share of variation, a power, a p.</summary>
    public const int ShareDigits = 3;

    private const double Small = 1e-4;
    private const double Large = 1e9;
    private const double NearlyOne = 0.9995;
    private const double UsualLevel = 0.05;
    private const int SmallDigits = 2;
    private const int MostDigits = 17;
    private const int WidestPlainExponent = 9;
    private const int NarrowestPlainExponent = -4;
    private const string Superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";

    private static readonly NumberFormatInfo Format = new() { NumberGroupSeparator = ",", NumberDecimalSeparator = ".", NegativeSign = "\u2212" };

    /// <summary>A whole number with its thousands set apart; one decimal when it is not whole, as degrees of freedom may be.</summary>
    public static string Count(double value) => value.ToString(value == Math.Floor(value) ? "N0" : "N1", Format);

    /// <summary>One decimal.</summary>
    public static string Tenths(double value) => value.ToString("N1", Format);

    /// <summary>Whole: what is a count by its meaning, such as effective rows.</summary>
    public static string Whole(double value) => value.ToString("N0", Format);

    public static string Number(double value) => Significant(value, UsualDigits);

    public static string Share(double value) => Significant(value, ShareDigits);

    /// <summary>So many significant digits, zeros at the end kept; digits before the decimal point are never rounded away below the widest exponent.</summary>
    public static string Significant(double value, int digits, int widest = WidestPlainExponent)
    {
        if (value == 0)
        {
            return "0";
        }

        string[] parts = Math.Abs(value).ToString(Scientific(digits), CultureInfo.InvariantCulture).Split('E');
        var exponent = int.Parse(parts[1], CultureInfo.InvariantCulture);
        if (exponent >= NarrowestPlainExponent && exponent < widest)
        {
            return value.ToString("N" + Math.Max(0, digits - 1 - exponent).ToString(CultureInfo.InvariantCulture), Format);
        }

        return (value < 0 ? Format.NegativeSign : "") + parts[0] + TimesTen(exponent);
    }

    /// <summary>A value that is written down somewhere, such as a policy's: its own digits, no more than so many, no zeros at the end.</summary>
    public static string Digits(double value, int digits)
    {
        if (value != 0 && (Math.Abs(value) < Small || Math.Abs(value) >= Large))
        {
            string[] parts = Math.Abs(value).ToString("0." + new string('#', digits - 1) + "E-0", CultureInfo.InvariantCulture).Split('E');
            return (value < 0 ? Format.NegativeSign : "") + parts[0] + TimesTen(int.Parse(parts[1], CultureInfo.InvariantCulture));
        }

        var rounded = decimal.Parse(value.ToString(Scientific(digits), CultureInfo.InvariantCulture), NumberStyles.Float, CultureInfo.InvariantCulture);
        return rounded.ToString("#,0.###########", Format);
    }

    /// <summary>A p where the level it is compared with is not at hand.</summary>
    public static string P(double p) => Probability(p, null, UsualLevel);

    /// <summary>Never zero, never one unless it is one, never rounded across the level it is compared with, and "&lt; 0.0001" where more would say nothing.</summary>
    /// <param name="log10">Decimal logarithm of p, for a p that a double cannot hold.</param>
    public static string Probability(double p, double? log10, double level) =>
        p < Small && level >= Small ? "< 0.0001"
        : p == 0 ? log10 is double power ? PowerOfTen(power) : "< 10⁻³⁰⁰"
        : p is > NearlyOne and < 1 ? "> 0.999"
        : p == 1 ? "1"
        : OnItsSide(p, level);

    /// <summary>"p = 0.0123", "p &lt; 0.0001".</summary>
    public static string PAgainst(double p, double level) => Probability(p, null, level) is var text && text[0] is '<' or '>' ? "p " + text : "p = " + text;

    private static string OnItsSide(double p, double level)
    {
        for (var digits = p < Small ? SmallDigits : ShareDigits; ; digits++)
        {
            if ((Rounded(p, digits) <= level) == (p <= level) || digits == MostDigits)
            {
                return Significant(p, digits, digits);
            }
        }
    }

    private static double Rounded(double value, int digits) => double.Parse(
        value.ToString(Scientific(digits), CultureInfo.InvariantCulture), NumberStyles.Float, CultureInfo.InvariantCulture);

    private static string PowerOfTen(double log10)
    {
        var exponent = Math.Floor(log10);
        return Math.Pow(10, log10 - exponent).ToString("0.0", CultureInfo.InvariantCulture) + TimesTen((int)exponent);
    }

    private static string Scientific(int digits) => "E" + (digits - 1).ToString(CultureInfo.InvariantCulture);

    private static string TimesTen(int exponent) => " × 10" + string.Concat(
        exponent.ToString(CultureInfo.InvariantCulture).Select(sign => sign == '-' ? '⁻' : Superscripts[sign - '0']));
}
