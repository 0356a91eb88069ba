using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>floors.json: for each declaration and kind of figure the decimal digits that must be correct. A floor may only rise.</summary>
internal static class FloorFile
{
    /// <summary>Set to 1, the floor tests write raised floors instead of only reading them.</summary>
    public const string RaiseSwitch = "AUDITOR_RAISE_FLOORS";

    private const string Name = "floors.json";
    private static readonly JsonSerializerOptions Layout = new() { WriteIndented = true };
    private static readonly Lock Gate = new();

    public static bool Raising => Environment.GetEnvironmentVariable(RaiseSwitch) == "1";

    public static SortedDictionary<string, SortedDictionary<string, int>> Read() => FloorTable.Read(ReferenceFiles.ReadText(Name));

    public static string Key(string name, string variant) => name + variant;

    /// <summary>The floor that a measured number of digits deserves: whole digits, three tenths below what was measured, at most 12.</summary>
    public static int Deserved(double digits) => (int)Math.Clamp(Math.Floor(digits - 0.3), 0, 12);

    public static void Raise(string key, IReadOnlyDictionary<string, double> measured)
    {
        lock (Gate)
        {
            SortedDictionary<string, SortedDictionary<string, int>> floors = Read();
            SortedDictionary<string, int> own = floors.TryGetValue(key, out SortedDictionary<string, int>? found) ? found : new(StringComparer.Ordinal);
            foreach ((string kind, double digits) in measured)
            {
                own[kind] = Math.Max(own.GetValueOrDefault(kind), Deserved(digits));
            }

            floors[key] = own;
            File.WriteAllText(ReferenceFiles.FullPath(Name), JsonSerializer.Serialize(floors, Layout) + "\n");
        }
    }
}
