namespace Auditor.Yaml;

/// <summary>How what was found is named in a message.</summary>
internal static class Words
{
    private const int Longest = 60;

    public static string Found(YamlValue node) => node switch
    {
        TextValue { IsPlain: true, Text: "" } => "nothing",
        TextValue { Text: "" } => "an empty text",
        TextValue scalar => "'" + Short(scalar.Text) + "'",
        ListValue => "a list",
        _ => "a map",
    };

    /// <summary>On one line and not too long to read.</summary>
    public static string Short(string text)
    {
        var line = string.Concat(text.Select(c => char.IsControl(c) ? ' ' : c));
        return line.Length <= Longest ? line : line[..Longest] + "…";
    }

    /// <summary><c>a, b or c</c>.</summary>
    public static string Or(IReadOnlyList<string> names) => names.Count < 2
        ? string.Concat(names)
        : string.Join(", ", names.Take(names.Count - 1)) + " or " + names[^1];

    /// <summary><c>a, b</c>, or <c>none</c>.</summary>
    public static string NoneOr(IReadOnlyList<string> names) => names.Count == 0 ? "none" : string.Join(", ", names);
}
