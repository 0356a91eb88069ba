using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace Auditor.Starting;

/// <summary>Texts as they may stand in a YAML file.</summary>
internal static partial class YamlText
{
    /// <summary>Plain words that other readers of YAML take for something else than text.</summary>
    private static readonly HashSet<string> _taken = new(["true", "false", "yes", "no", "on", "off", "y", "n", "null"], StringComparer.OrdinalIgnoreCase);

    /// <summary>A value or key, in quotation marks when it needs them.</summary>
    public static string Of(string text) => Plain().IsMatch(text) && !_taken.Contains(text) ? text : Quoted(text);

    /// <summary>A comment, on one line whatever is in it.</summary>
    public static string Comment(string text) => string.Concat(text.Select(c => NeedsEscape(c) ? ' ' : c));

    private static string Quoted(string text)
    {
        var quoted = new StringBuilder("\"");
        foreach (var c in text)
        {
            quoted.Append(c is '"' or '\\' ? "\\" + c : NeedsEscape(c) ? string.Create(CultureInfo.InvariantCulture, $"\\u{(int)c:X4}") : c.ToString());
        }

        return quoted.Append('"').ToString();
    }

    /// <summary>What would end the line or cannot stand in YAML.</summary>
    private static bool NeedsEscape(char c) => char.IsControl(c) || c is '\u2028' or '\u2029' or '\uFEFF' or '\uFFFE' or '\uFFFF';

    [GeneratedRegex(@"\A[\p{L}_](?:[\p{L}\p{N}_./ -]*[\p{L}\p{N}_])?\z", RegexOptions.CultureInvariant)]
    private static partial Regex Plain();
}
