using System.Globalization;
using System.Numerics;
using System.Text.RegularExpressions;

namespace Auditor.Declaration;

/// <summary>What a printed figure says of the number: that it is it after rounding, or a bound.</summary>
public enum PrintedRelation
{
    Rounded,
    Below,
    AtMost,
    Above,
    AtLeast,
}

/// <summary>
/// A number as a report prints it: 0.310 claims three decimals, and so a number from 0.3095 to 0.3105. A comma is a decimal comma, per cent is a
/// hundredth, an exponent moves the digits; thousands marks are not read. Arithmetic on the digits is exact, and only its result is rounded to a double.
/// </summary>
/// <param name="Digits">All digits as one whole number, without sign.</param>
/// <param name="Exponent">Power of ten of the last digit, per cent counted.</param>
/// <param name="Negative">A minus sign was printed, in front of a zero too.</param>
/// <param name="Percent">A per cent sign was printed.</param>
/// <param name="Scientific">An exponent was printed.</param>
/// <param name="MaybeThousands">Printed as one to three digits, a comma and three digits: with another convention the comma would be a thousands mark.</param>
public sealed partial record PrintedNumber(
    PrintedRelation Relation, BigInteger Digits, int Exponent, bool Negative, bool Percent, bool Scientific, bool MaybeThousands)
{
    private const int MostDigits = 40;
    private const int LargestExponent = 250;

    private static readonly Dictionary<string, PrintedRelation> Relations = new(StringComparer.Ordinal)
    {
        [""] = PrintedRelation.Rounded,
        ["<"] = PrintedRelation.Below,
        ["<="] = PrintedRelation.AtMost,
        ["≤"] = PrintedRelation.AtMost,
        [">"] = PrintedRelation.Above,
        [">="] = PrintedRelation.AtLeast,
        ["≥"] = PrintedRelation.AtLeast,
    };

    /// <summary>The number itself, correctly rounded.</summary>
    public double Value => Scaled(0);

    /// <summary>Half a unit of the last digit.</summary>
    public double HalfUnit => Parse(5, Exponent - 1);

    /// <summary>The least number that rounds to this one; for a printed 0 that of the other sign too, as programs differ in printing its sign.</summary>
    public double Lower => Math.Min(Scaled(-5), Scaled(5));

    /// <summary>The largest number that rounds to this one.</summary>
    public double Upper => Digits.IsZero && Negative ? 0 : Math.Max(Scaled(-5), Scaled(5));

    /// <summary>The same digits with the per cent sign left out; null when there is none.</summary>
    public PrintedNumber? WithoutPercent => Percent ? this with { Percent = false, Exponent = Exponent + 2 } : null;

    /// <summary>The same digits with the comma as a thousands mark; null when it cannot be one.</summary>
    public PrintedNumber? AsThousands => MaybeThousands ? this with { MaybeThousands = false, Exponent = Exponent + 3 } : null;

    /// <summary>Null when the text is no such number, or one beyond what a double holds.</summary>
    public static PrintedNumber? Read(string text)
    {
        var match = Printed().Match(text);
        if (!match.Success)
        {
            return null;
        }

        var (whole, decimals) = (match.Groups["whole"].Value, match.Groups["decimals"].Value);
        var percent = match.Groups["percent"].Success;
        var power = match.Groups["power"] is { Success: true, Value: var printed } ? Power(printed) : 0;
        if (whole.Length + decimals.Length is 0 or > MostDigits || power is not int exponent)
        {
            return null;
        }

        return new PrintedNumber(
            Relations[match.Groups["relation"].Value],
            BigInteger.Parse("0" + whole + decimals, NumberStyles.None, CultureInfo.InvariantCulture),
            exponent - decimals.Length - (percent ? 2 : 0),
            match.Groups["sign"].Value is "-" or "−",
            percent,
            match.Groups["power"].Success,
            match.Groups["mark"].Value == "," && !match.Groups["power"].Success && whole.Length is >= 1 and <= 3 && whole[0] != '0' && decimals.Length == 3);
    }

    private static int? Power(string text) =>
        int.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out var power) && Math.Abs(power) <= LargestExponent ? power : null;

    /// <summary>The number moved by so many tenths of a unit of its last digit, away from zero.</summary>
    private double Scaled(int tenths)
    {
        var size = Parse((Digits * 10) + tenths, Exponent - 1);
        return Negative ? -size : size;
    }

    private static double Parse(BigInteger digits, int exponent) =>
        double.Parse(string.Create(CultureInfo.InvariantCulture, $"{digits}e{exponent}"), NumberStyles.Float, CultureInfo.InvariantCulture);

    [GeneratedRegex(
        @"\A(?:(?<relation><=|≤|<|>=|≥|>) ?)?(?<sign>[+\-−])?(?<whole>[0-9]*)(?:(?<mark>[.,])(?<decimals>[0-9]*))?(?:[eE](?<power>[+-]?[0-9]+))?(?<percent>[ \u00A0\u202F]?%)?\z",
        RegexOptions.CultureInvariant)]
    private static partial Regex Printed();
}
