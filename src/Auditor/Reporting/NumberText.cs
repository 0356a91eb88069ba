using System.Globalization;

namespace Auditor.Reporting;

/// <summary>Numbers in tables, pictures and lists of a page: those of sentences, kept on one line.</summary>
internal static class NumberText
{
    private const int WidestPlainExponent = 9;
    private const int NarrowestPlainExponent = -4;
    private const int MostDigits = 15;

    private static readonly NumberFormatInfo Ticks = new() { NumberGroupSeparator = ",", NumberDecimalSeparator = ".", NegativeSign = "\u2212" };

    /// <summary>A whole number with its thousands set apart; one decimal when it is not whole, as degrees of freedom may be.</summary>
    public static string Count(double value) => PlainNumber.Count(value);

    /// <summary>One decimal, for what is compared by differences or counted in parts.</summary>
    public static string Tenths(double value) => PlainNumber.Tenths(value);

    /// <summary>Four significant digits; digits before the decimal point are never rounded away.</summary>
    public static string Number(double value) => Kept(PlainNumber.Number(value));

    /// <summary>Three significant digits, for shares of variation and powers.</summary>
    public static string Share(double value) => Kept(PlainNumber.Share(value));

    /// <summary>At most as many significant digits as can be trusted: a long number becomes a power of ten rather than show more.</summary>
    /// <param name="trusted">Decimal digits that can be trusted; null when not known.</param>
    public static string Trusted(double value, double? trusted)
    {
        int digits = TrustedDigits(trusted);
        return digits < 1 ? "no digit can be trusted" : Kept(PlainNumber.Significant(value, digits, digits));
    }

    /// <summary>A value as the policy states it: all its digits.</summary>
    public static string Plain(double value) => Kept(PlainNumber.Digits(value, MostDigits));

    /// <summary>A number that names something, such as a year or a row: no mark between thousands.</summary>
    public static string Label(double value) => value.ToString("0.######", Ticks);

    /// <summary>A mark of an axis: as many decimals as its steps need.</summary>
    public static string Tick(double value, double step)
    {
        int exponent = (int)Math.Floor(Math.Log10(step) + 1e-9);
        double rounded = Math.Round(value / step) * step;
        return Math.Abs(rounded) < step / 2 ? "0"
            : exponent < NarrowestPlainExponent || Math.Abs(rounded) >= Math.Pow(10, WidestPlainExponent)
                ? Kept(PlainNumber.Significant(rounded, Math.Clamp((int)Math.Floor(Math.Log10(Math.Abs(rounded)) + 1e-9) - exponent + 1, 1, MostDigits), 0))
                : rounded.ToString("N" + Math.Max(0, -exponent).ToString(CultureInfo.InvariantCulture), Ticks);
    }

    /// <summary>Every digit of the double, for a title.</summary>
    public static string Full(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    public static string Percent(double share) => (100 * share).ToString("0.##", Ticks) + "\u00A0%";

    /// <summary>Never zero, never one unless it is one, and never rounded across the level it is compared with.</summary>
    /// <param name="log10">Decimal logarithm of p, for a p that a double cannot hold.</param>
    public static string Probability(double p, double? log10, double level) => Kept(PlainNumber.Probability(p, log10, level));

    private static int TrustedDigits(double? trusted) =>
        trusted is double known ? (int)Math.Clamp(Math.Floor(known), 0, PlainNumber.UsualDigits) : PlainNumber.UsualDigits;

    private static string Kept(string text) => text.Replace(' ', '\u00A0');
}
