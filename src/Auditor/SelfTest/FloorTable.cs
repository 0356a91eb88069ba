using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>floors.json: for each declaration or file of values, and kind of figure, the decimal digits that must be correct. A floor may only rise.</summary>
internal static class FloorTable
{
    public static IReadOnlyDictionary<string, SortedDictionary<string, int>> Read(string json) =>
        JsonSerializer.Deserialize<SortedDictionary<string, SortedDictionary<string, int>>>(json)!;

    /// <summary>The key of a file of values of a distribution.</summary>
    public static string Distribution(string file) => "distribution " + file;
}
