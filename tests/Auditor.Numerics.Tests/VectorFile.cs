using System.Text.Json;

namespace Auditor.Numerics.Tests;

/// <summary>A worked case of tests/vectors: inputs in full, outputs made by an independent implementation (numpy; see its own text).</summary>
internal sealed class VectorFile
{
    private readonly JsonElement _root;

    public VectorFile(string name) =>
        _root = JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "vectors", name + ".json"))).RootElement;

    public JsonElement Inputs => _root.GetProperty("inputs");

    public JsonElement Outputs => _root.GetProperty("outputs");

    public double[] Input(params string[] path) => Doubles(Walk(Inputs, path));

    public double Output(params string[] path) => Walk(Outputs, path).GetDouble();

    public static double[] Doubles(JsonElement array) => [.. array.EnumerateArray().Select(value => value.GetDouble())];

    public static void Near(double expected, double? actual, double relative = 1e-9) =>
        Assert.True(
            actual is double value && Math.Abs(value - expected) <= relative * Math.Abs(expected),
            $"expected {expected:R}, found {actual:R}");

    private static JsonElement Walk(JsonElement from, string[] path) => path.Aggregate(from, (at, key) => at.GetProperty(key));
}
