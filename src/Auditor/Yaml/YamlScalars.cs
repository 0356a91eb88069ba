using System.Globalization;
using YamlDotNet.Core;
using YamlDotNet.RepresentationModel;

namespace Auditor.Yaml;

/// <summary>What a scalar says. Only an unquoted one can be a number or a flag: quotes make it text.</summary>
internal static class YamlScalars
{
    public static bool IsPlain(YamlScalarNode scalar) => scalar.Style is ScalarStyle.Plain;

    /// <summary>A finite number with a decimal point, exponent allowed; null when it is not one.</summary>
    public static double? Number(YamlScalarNode scalar) =>
        IsPlain(scalar)
        && double.TryParse(scalar.Value, NumberStyles.Float & ~NumberStyles.AllowLeadingWhite & ~NumberStyles.AllowTrailingWhite, CultureInfo.InvariantCulture, out var number)
        && double.IsFinite(number)
            ? number
            : null;

    public static bool? Flag(YamlScalarNode scalar) => !IsPlain(scalar) ? null : scalar.Value switch
    {
        "true" => true,
        "false" => false,
        _ => null,
    };

    public static string Text(YamlScalarNode scalar) => scalar.Value ?? "";
}
