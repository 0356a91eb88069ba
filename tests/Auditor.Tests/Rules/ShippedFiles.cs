using Auditor.Policies;

namespace Auditor.Tests.Rules;

/// <summary>The rule folder as it ships, copied beside the tests.</summary>
internal static class ShippedFiles
{
    public static string Folder { get; } = Path.Combine(AppContext.BaseDirectory, "rules");

    public static string Text(string name) => File.ReadAllText(Path.Combine(Folder, name));

    /// <summary>Name and text of every file of the folder (or of one below it), in name order.</summary>
    public static IReadOnlyList<(string File, string Yaml)> All(string below = "") =>
        [.. Directory.GetFiles(Path.Combine(Folder, below), "*.yaml")
            .Order(StringComparer.Ordinal)
            .Select(path => (Path.GetFileName(path), File.ReadAllText(path)))
            .Where(file => file.Item1 != "policy.yaml")];

    public static Policy Policy()
    {
        var reading = PolicyReader.Read(Text("policy.yaml"), "policy.yaml", null, null);
        Assert.Empty(reading.Problems);
        return reading.Value!;
    }
}
