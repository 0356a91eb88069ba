using System.Globalization;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Lists in which nothing may stand twice.</summary>
internal static class Distinct
{
    /// <summary>The texts that could be read; one that stands a second time is a problem.</summary>
    /// <param name="what">What one of them is, for the message.</param>
    public static IReadOnlyList<string> Texts(IReadOnlyList<Place> items, string what, Func<Place, string?> read)
    {
        var lines = new Dictionary<string, int>(StringComparer.Ordinal);
        var texts = new List<string>();
        foreach (var item in items)
        {
            if (read(item) is not { } text)
            {
                continue;
            }

            if (lines.TryAdd(text, item.Line))
            {
                texts.Add(text);
            }
            else
            {
                item.Add(Twice(what, text, lines[text]));
            }
        }

        return texts;
    }

    public static string Twice(string what, string name, int firstLine) =>
        string.Create(CultureInfo.InvariantCulture, $"the {what} '{Words.Short(name)}' stands twice, first on line {firstLine}");
}
