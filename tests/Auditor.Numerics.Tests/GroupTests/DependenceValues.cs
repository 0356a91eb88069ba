using System.Text.Json;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>Designs and values of GroupTests/values/dependence.json, made by make_values.R beside it (clubSandwich, sandwich).</summary>
internal static class DependenceValues
{
    private static readonly JsonElement Root = JsonDocument.Parse(
        File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "GroupTests", "values", "dependence.json"))).RootElement;

    public static IEnumerable<string> Names(string kind) => Root.GetProperty(kind).EnumerateArray().Select(one => one.GetProperty("name").GetString()!);

    public static JsonElement Case(string kind, string name) =>
        Root.GetProperty(kind).EnumerateArray().Single(one => one.GetProperty("name").GetString() == name);

    public static MatrixDesign Design(JsonElement value, int blockRows = 7) => new(
        true,
        Columns(value, "final"),
        [Columns(value, "group")],
        VectorFile.Doubles(value.GetProperty("response")),
        Optional(value, "weights"),
        Optional(value, "copies"),
        blockRows);

    public static RowClasses Classes(JsonElement value, string name) =>
        RowClasses.Ranked([.. VectorFile.Doubles(value.GetProperty(name)).Select(code => (int)code)]);

    private static double[][] Columns(JsonElement value, string name) => [.. value.GetProperty(name).EnumerateArray().Select(VectorFile.Doubles)];

    private static double[]? Optional(JsonElement value, string name) =>
        value.TryGetProperty(name, out var found) && found.ValueKind == JsonValueKind.Array ? VectorFile.Doubles(found) : null;
}
