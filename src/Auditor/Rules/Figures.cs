using System.Globalization;
using Auditor.Facts;

namespace Auditor.Rules;

/// <summary>Values as messages show them: few digits, never a p of 0, the same in every culture.</summary>
internal static class Figures
{
    private const double SmallestShown = 1e-300;
    private const double Small = 1e-4;
    private const double Large = 1e9;

    public static string Shown(FactValue value, string unit) => value switch
    {
        FactValue.Count count => count.Value.ToString("#,0", CultureInfo.InvariantCulture),
        FactValue.Number number when unit == FactUnits.P => P(number.Value),
        FactValue.Number number when unit == FactUnits.Share => Digits(100 * number.Value, 3) + " %",
        FactValue.Number number => Digits(number.Value, 4),
        FactValue.Text text => text.Value,
        FactValue.Flag flag => flag.Value ? "true" : "false",
        _ => "not computed",
    };

    private static string P(double p) => p < SmallestShown ? "below 1e-300" : Digits(p, 3);

    /// <summary>So many significant digits; beyond everyday sizes with an exponent.</summary>
    private static string Digits(double value, int digits)
    {
        if (value != 0 && (Math.Abs(value) < Small || Math.Abs(value) >= Large))
        {
            return value.ToString("0." + new string('#', digits - 1) + "e-0", CultureInfo.InvariantCulture);
        }

        var rounded = decimal.Parse(value.ToString("E" + (digits - 1), CultureInfo.InvariantCulture), NumberStyles.Float, CultureInfo.InvariantCulture);
        return rounded.ToString("#,0.###########", CultureInfo.InvariantCulture);
    }
}
