using System.Text.RegularExpressions;

namespace Auditor.Cli;

/// <summary>Commands as they can be typed where this one was.</summary>
internal static partial class Shell
{
    /// <summary>The script as it was called, which tells it in this variable.</summary>
    private const string CalledAs = "AUDITOR_CALLED_AS";

    public static string Program => Word(Environment.GetEnvironmentVariable(CalledAs) is { Length: > 0 } script ? script : "./run-audit.sh");

    /// <summary>One word of a command, in quotation marks when it needs them.</summary>
    public static string Word(string text) => Plain().IsMatch(text) ? text : "'" + text.Replace("'", "'\\''", StringComparison.Ordinal) + "'";

    [GeneratedRegex(@"\A[\p{L}\p{N}_./:=,@%+-]+\z", RegexOptions.CultureInvariant)]
    private static partial Regex Plain();
}
