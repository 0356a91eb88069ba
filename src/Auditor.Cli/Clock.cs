using System.Globalization;

namespace Auditor.Cli;

/// <summary>The moment of the run, fixed by SOURCE_DATE_EPOCH (the reproducible-builds convention) when that is set.</summary>
internal static class Clock
{
    private const string Variable = "SOURCE_DATE_EPOCH";

    /// <summary>UTC. What is set and is no moment is a problem: a run that was to be repeated would else be of another moment, without a word.</summary>
    public static DateTimeOffset Now(ICollection<string> problems)
    {
        var text = Environment.GetEnvironmentVariable(Variable);
        if (text is null)
        {
            return DateTimeOffset.UtcNow;
        }

        if (long.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var seconds) && seconds <= DateTimeOffset.MaxValue.ToUnixTimeSeconds())
        {
            return DateTimeOffset.FromUnixTimeSeconds(seconds);
        }

        problems.Add($"{Variable}: '{text}' is not a whole number of seconds since 1970-01-01");
        return DateTimeOffset.UnixEpoch;
    }

    public static string Text(DateTimeOffset moment) => moment.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);

    /// <summary>The day in UTC.</summary>
    public static DateOnly Day(DateTimeOffset moment) => DateOnly.FromDateTime(moment.UtcDateTime);
}
