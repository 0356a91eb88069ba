using System.Globalization;

namespace Auditor.Yaml;

/// <summary>What is held against a YAML text before it is parsed.</summary>
internal static class YamlCharacters
{
    /// <summary>Far above any file that a person writes; parsing time grows with it.</summary>
    public const int LongestText = 4_000_000;

    private const char ByteOrderMark = '\uFEFF';

    /// <summary>The text without its byte order mark, or null when it cannot be YAML. The parser would take a NUL for the end of the file.</summary>
    public static string? Checked(string text, ProblemList problems)
    {
        if (text.Length > LongestText)
        {
            problems.Add(null, string.Create(CultureInfo.InvariantCulture, $"the file is longer than {LongestText} characters"));
            return null;
        }

        if (FirstForbidden(text) is int at)
        {
            problems.Add(LineOf(text, at), string.Create(CultureInfo.InvariantCulture, $"the control character U+{(int)text[at]:X4} cannot stand in YAML"));
            return null;
        }

        return text.TrimStart(ByteOrderMark);
    }

    /// <summary>A control character other than tab and line ends.</summary>
    public static bool IsForbidden(char c) => char.IsControl(c) && c is not ('\t' or '\n' or '\r' or '\u0085');

    private static int? FirstForbidden(string text)
    {
        for (var i = 0; i < text.Length; i++)
        {
            if (IsForbidden(text[i]))
            {
                return i;
            }
        }

        return null;
    }

    private static int LineOf(string text, int at) => 1 + text.AsSpan(0, at).Count('\n');
}
