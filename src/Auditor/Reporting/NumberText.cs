using System.Globalization;

namespace Auditor.Reporting;

/// <summary>The one place that turns numbers into text for readers: the same in every culture, and never more digits than asked for.</summary>
internal static class NumberText
{
    private const int UsualDigits = 4;
    private const int ShareDigits = 3;
    private const int ProbabilityDigits = 3;
    private const double SmallestPlainProbability = 0.0001;
    private const int WidestPlainExponent = 9;
    private const int NarrowestPlainExponent = -4;
    private const string Superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";

    private static readonly NumberFormatInfo Format = new()
    {
        NumberGroupSeparator = "\u202F",
        NumberDecimalSeparator = ".",
        NegativeSign = "\u2212",
    };

    /// <summary>A whole number with its thousands set apart; one decimal when it is not whole, as degrees of freedom may be.</summary>
    public static string Count(double value) => value.ToString(value == Math.Floor(value) ? "N0" : "N1", Format);

    /// <summary>One decimal, for what is compared by differences or counted in parts.</summary>
    public static string Tenths(double value) => value.ToString("N1", Format);

    /// <summary>Four significant digits; digits before the decimal point are never rounded away.</summary>
    public static string Number(double value) => Significant(value, UsualDigits, WidestPlainExponent);

    /// <summary>Three significant digits, for shares of variation and powers.</summary>
    public static string Share(double value) => Significant(value, ShareDigits, WidestPlainExponent);

    /// <summary>At most as many significant digits as can be trusted: a long number becomes a power of ten rather than show more.</summary>
    /// <param name="trusted">Decimal digits that can be trusted; null when not known.</param>
    public static string Trusted(double value, double? trusted)
    {
        int digits = TrustedDigits(trusted);
        return digits < 1 ? "no digit can be trusted" : Significant(value, digits, digits);
    }

    /// <summary>A value as the policy states it: all its digits.</summary>
    public static string Plain(double value) => value.ToString("R", Format);

    /// <summary>A mark of an axis: as many decimals as its steps need.</summary>
    public static string Tick(double value, double step)
    {
        int exponent = (int)Math.Floor(Math.Log10(step) + 1e-9);
        double rounded = Math.Round(value / step) * step;
        return Math.Abs(rounded) < step / 2 ? "0"
            : exponent < NarrowestPlainExponent || Math.Abs(rounded) >= Math.Pow(10, WidestPlainExponent)
                ? Significant(rounded, Math.Clamp((int)Math.Floor(Math.Log10(Math.Abs(rounded)) + 1e-9) - exponent + 1, 1, 15), 0)
                : rounded.ToString("N" + Math.Max(0, -exponent).ToString(CultureInfo.InvariantCulture), Format);
    }

    /// <summary>Every digit of the double, for a title.</summary>
    public static string Full(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    public static string Percent(double share) => (100 * share).ToString("0.##", Format) + "\u00A0%";

    /// <summary>Never zero, never one unless it is one, and never rounded across the level it is compared with.</summary>
    /// <param name="log10">Decimal logarithm of p, for a p that a double cannot hold.</param>
    public static string Probability(double p, double? log10, double level)
    {
        if (p == 0)
        {
            return log10 is double power ? PowerOfTen(power) : "< 10⁻³⁰⁰";
        }

        return p is > 0.9995 and < 1 ? "> 0.999" : p == 1 ? "1" : OnItsSide(p, level);
    }

    private static string OnItsSide(double p, double level)
    {
        for (int digits = p < SmallestPlainProbability ? 2 : ProbabilityDigits; ; digits++)
        {
            if ((Rounded(p, digits) <= level) == (p <= level) || digits == 17)
            {
                return Significant(p, digits, digits);
            }
        }
    }

    private static double Rounded(double value, int digits) => double.Parse(
        value.ToString(Scientific(digits), CultureInfo.InvariantCulture), NumberStyles.Float, CultureInfo.InvariantCulture);

    private static int TrustedDigits(double? trusted) =>
        trusted is double known ? (int)Math.Clamp(Math.Floor(known), 0, UsualDigits) : UsualDigits;

    private static string Significant(double value, int digits, int widest)
    {
        if (value == 0)
        {
            return "0";
        }

        string[] parts = Math.Abs(value).ToString(Scientific(digits), CultureInfo.InvariantCulture).Split('E');
        int exponent = int.Parse(parts[1], CultureInfo.InvariantCulture);
        if (exponent >= NarrowestPlainExponent && exponent < widest)
        {
            int decimals = Math.Max(0, digits - 1 - exponent);
            return value.ToString("N" + decimals.ToString(CultureInfo.InvariantCulture), Format);
        }

        return (value < 0 ? Format.NegativeSign : "") + parts[0] + TimesTen(exponent);
    }

    private static string PowerOfTen(double log10)
    {
        double exponent = Math.Floor(log10);
        double mantissa = Math.Pow(10, log10 - exponent);
        return mantissa.ToString("0.0", CultureInfo.InvariantCulture) + TimesTen((int)exponent);
    }

    private static string Scientific(int digits) => "E" + (digits - 1).ToString(CultureInfo.InvariantCulture);

    private static string TimesTen(int exponent) => "\u00A0×\u00A010" + string.Concat(
        exponent.ToString(CultureInfo.InvariantCulture).Select(sign => sign == '-' ? '⁻' : Superscripts[sign - '0']));
}
