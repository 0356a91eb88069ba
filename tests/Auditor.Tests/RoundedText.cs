using System.Globalization;
using System.Text.RegularExpressions;

namespace Auditor.Tests;

/// <summary>Text whose full doubles are rounded to seven digits, so that the last bits of a logarithm do not matter to a kept file.</summary>
internal static partial class RoundedText
{
    private const double Nothing = 1e-25;

    public static string Of(string text) => LongNumber().Replace(text, match =>
    {
        var number = double.Parse(match.Value, NumberStyles.Float, CultureInfo.InvariantCulture);
        return Math.Abs(number) < Nothing ? "tiny" : number.ToString("G7", CultureInfo.InvariantCulture);
    });

    [GeneratedRegex(@"-?[0-9]+\.[0-9]{6,}(?:[eE][-+]?[0-9]+)?|-?[0-9]+(?:\.[0-9]+)?[eE][-+]?[0-9]+")]
    private static partial Regex LongNumber();
}
