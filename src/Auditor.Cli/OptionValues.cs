using System.Globalization;
using Auditor.Findings;
using Auditor.Yaml;

namespace Auditor.Cli;

/// <summary>Values of options: read strictly, what was found and what was expected said.</summary>
internal static class OptionValues
{
    private static readonly string[] Built = ["html", "json"];
    private static readonly string[] Later = ["sarif", "junit", "md", "csv"];
    private static readonly string[] Severities = ["high", "medium", "low", "never"];

    public static IReadOnlyList<string> Formats(string? list, ICollection<string> problems)
    {
        var formats = (list ?? "html,json").Split(',', StringSplitOptions.TrimEntries).Distinct(StringComparer.Ordinal).ToList();
        foreach (var format in formats.Except(Built))
        {
            problems.Add(Later.Contains(format)
                ? $"--formats: {format} is not built yet"
                : $"--formats: '{format}' is not a format; known: {string.Join(", ", Built)}");
        }

        return formats;
    }

    public static Severity? FailOn(string? text, ICollection<string> problems)
    {
        switch (text ?? "high")
        {
            case "high": return Severity.High;
            case "medium": return Severity.Medium;
            case "low": return Severity.Low;
            case "never": return null;
            default:
                problems.Add($"--fail-on: '{text}' is not a severity" + NearestName.Hint(text!, Severities));
                return null;
        }
    }

    public static long Whole(string option, string? text, long preset, long least, long most, ICollection<string> problems)
    {
        if (text is null)
        {
            return preset;
        }

        if (long.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var value) && value >= least && value <= most)
        {
            return value;
        }

        problems.Add(string.Create(CultureInfo.InvariantCulture, $"{option}: '{text}' is not a whole number of at least {least}"));
        return preset;
    }

    /// <summary>Bytes; K, M and G stand for powers of 1024.</summary>
    public static long? Size(string option, string? text, ICollection<string> problems)
    {
        if (text is null)
        {
            return null;
        }

        var unit = text.Length > 0 ? "KMG".IndexOf(char.ToUpperInvariant(text[^1]), StringComparison.Ordinal) : -1;
        var digits = unit < 0 ? text : text[..^1];
        if (long.TryParse(digits, NumberStyles.None, CultureInfo.InvariantCulture, out var value) && value is > 0 and < 1L << 33)
        {
            return value << (10 * (unit + 1));
        }

        problems.Add($"{option}: '{text}' is not a size, such as 512M or 4G");
        return null;
    }

    public static DateOnly? Date(string option, string? text, ICollection<string> problems)
    {
        if (text is null)
        {
            return null;
        }

        if (DateOnly.TryParseExact(text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out var date))
        {
            return date;
        }

        problems.Add($"{option}: '{text}' is not a date as YYYY-MM-DD");
        return null;
    }
}
