using System.Globalization;

namespace Auditor.Cli;

/// <summary>What the operating system says of its memory.</summary>
internal static class SystemMemory
{
    private const string Linux = "/proc/meminfo";
    private const string Key = "MemAvailable:";

    /// <summary>Bytes that can be had without swapping; null where the system does not say it in a file.</summary>
    public static long? Available()
    {
        try
        {
            var line = File.Exists(Linux) ? File.ReadLines(Linux).FirstOrDefault(one => one.StartsWith(Key, StringComparison.Ordinal)) : null;
            return line is not null && long.TryParse(line[Key.Length..].Replace("kB", "", StringComparison.Ordinal), CultureInfo.InvariantCulture, out var kilobytes)
                ? kilobytes << 10
                : null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }
}
