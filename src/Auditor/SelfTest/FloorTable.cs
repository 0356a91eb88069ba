using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>floors.json: for each declaration or file of values, and kind of figure, the decimal digits that must be correct. A floor may only rise.</summary>
internal static class FloorTable
{
    public static SortedDictionary<string, SortedDictionary<string, int>> Read(string json)
    {
        var read = JsonSerializer.Deserialize(json, SelfTestShapes.Default.Floors)!;
        var sorted = read.ToDictionary(line => line.Key, line => new SortedDictionary<string, int>(line.Value, StringComparer.Ordinal));
        return new SortedDictionary<string, SortedDictionary<string, int>>(sorted, StringComparer.Ordinal);
    }

    /// <summary>The key of a file of values of a distribution.</summary>
    public static string Distribution(string file) => "distribution " + file;
}
