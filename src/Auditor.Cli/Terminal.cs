using System.Globalization;

namespace Auditor.Cli;

/// <summary>Text from files on its way to the terminal: control characters are written out, so that they cannot steer it.</summary>
internal static class Terminal
{
    public static string Safe(string text) => string.Concat(text.Select(c =>
        char.IsControl(c) && c != '\n' ? string.Create(CultureInfo.InvariantCulture, $"\\x{(int)c:X2}") : c.ToString()));
}
