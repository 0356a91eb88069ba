namespace Auditor.Data;

/// <summary>
/// Fields in quotation marks after RFC 4180: the whole field stands between two marks, and a mark inside is doubled.
/// A mark anywhere else is refused, since it makes the field swallow separators and lines after it without a word.
/// </summary>
internal static class QuotedField
{
    private const char Mark = '"';

    /// <summary>Whether a field as it stands in the file follows the rule.</summary>
    public static bool IsWellFormed(ReadOnlySpan<char> field)
    {
        if (!field.StartsWith(Mark))
        {
            return !field.Contains(Mark);
        }

        return field.Length >= 2 && field[^1] == Mark && HasOnlyDoubledMarks(field[1..^1]);
    }

    /// <summary>The content of a well-formed field.</summary>
    public static ReadOnlySpan<char> Content(ReadOnlySpan<char> field)
    {
        if (!field.StartsWith(Mark))
        {
            return field;
        }

        var inside = field[1..^1];
        return inside.Contains(Mark) ? inside.ToString().Replace("\"\"", "\"", StringComparison.Ordinal) : inside;
    }

    private static bool HasOnlyDoubledMarks(ReadOnlySpan<char> inside)
    {
        for (var at = inside.IndexOf(Mark); at >= 0; at = inside.IndexOf(Mark))
        {
            if (at + 1 == inside.Length || inside[at + 1] != Mark)
            {
                return false;
            }

            inside = inside[(at + 2)..];
        }

        return true;
    }
}
