using System.Globalization;

namespace Auditor.Cli;

/// <summary>The moment of the run, fixed by SOURCE_DATE_EPOCH (the reproducible-builds convention) when that is set.</summary>
internal static class Clock
{
    public static string Started => Now.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);

    private static DateTimeOffset Now =>
        long.TryParse(Environment.GetEnvironmentVariable("SOURCE_DATE_EPOCH"), NumberStyles.None, CultureInfo.InvariantCulture, out var seconds)
            && seconds <= DateTimeOffset.MaxValue.ToUnixTimeSeconds()
            ? DateTimeOffset.FromUnixTimeSeconds(seconds)
            : DateTimeOffset.UtcNow;
}
