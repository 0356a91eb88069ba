using System.Globalization;

namespace Auditor.Yaml;

/// <summary>What a scalar says where its type is not fixed by its key. Only an unquoted one can be a number or a flag: quotes make it text.</summary>
internal static class ScalarValues
{
    private const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    /// <summary>A finite number with a decimal point, exponent allowed; null when it is not one.</summary>
    public static double? Number(this TextValue scalar) =>
        scalar.IsPlain && double.TryParse(scalar.Text, Style, CultureInfo.InvariantCulture, out var number) && double.IsFinite(number) ? number : null;

    public static bool? Flag(this TextValue scalar) => !scalar.IsPlain ? null : scalar.Text switch
    {
        "true" => true,
        "false" => false,
        _ => null,
    };
}
