using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>One reference case: what other programs computed, in double precision and, for small data, with 100 digits.</summary>
internal sealed class ReferenceCase
{
    private ReferenceCase(JsonElement line, Func<string, string> read)
    {
        Name = line.Text("name");
        Tolerance = line.GetProperty("suggested_relative_tolerance").GetDouble();
        Values = Parse(read(Name + "/case.json"));
        Exact = line.GetProperty("has_exact_json").GetBoolean() ? Parse(read(Name + "/exact.json")) : null;
    }

    public string Name { get; }

    public string Title => Values.Text("title");

    /// <summary>The relative difference within which the independent routes agree on case.json.</summary>
    public double Tolerance { get; }

    public JsonElement Values { get; }

    /// <summary>The 100-digit values; null for large data.</summary>
    public JsonElement? Exact { get; }

    public IEnumerable<JsonElement> Groups => Values.GetProperty("group_tests").EnumerateArray();

    /// <summary>Names of all cases that the index lists.</summary>
    public static IReadOnlyList<string> Names(Func<string, string> read) => [.. Index(read).EnumerateArray().Select(line => line.Text("name"))];

    /// <param name="read">Gives the text of a file by its path below the folder of the cases.</param>
    public static ReferenceCase Read(string name, Func<string, string> read) =>
        new(Index(read).Find("name", name) ?? throw new KeyNotFoundException("index.json does not list " + name), read);

    private static JsonElement Index(Func<string, string> read) => Parse(read("index.json")).GetProperty("cases");

    private static JsonElement Parse(string text)
    {
        using JsonDocument document = JsonDocument.Parse(text);
        return document.RootElement.Clone();
    }
}
