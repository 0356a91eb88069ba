using System.Text.Json;

namespace Auditor.Tests.Reference;

/// <summary>One reference case: what other programs computed, in double precision and, for small data, with 100 digits.</summary>
internal sealed class ReferenceCase
{
    private static readonly Lazy<Dictionary<string, ReferenceCase>> Cases = new(LoadAll);

    private ReferenceCase(JsonElement line)
    {
        Name = line.Text("name");
        Tolerance = line.GetProperty("suggested_relative_tolerance").GetDouble();
        Values = Load(Name + "/case.json");
        Exact = line.GetProperty("has_exact_json").GetBoolean() ? Load(Name + "/exact.json") : null;
    }

    public static IEnumerable<ReferenceCase> All => Cases.Value.Values;

    public string Name { get; }

    /// <summary>The relative difference within which the independent routes agree on case.json.</summary>
    public double Tolerance { get; }

    public JsonElement Values { get; }

    /// <summary>The 100-digit values; null for large data.</summary>
    public JsonElement? Exact { get; }

    public bool IsPolynomial => File.Exists(Path.Combine(TestFolders.Reference, Name, "declaration-powers.yaml"));

    /// <summary>Endings of the declarations of this case.</summary>
    public IEnumerable<string> Variants => IsPolynomial ? ["", "-largest", "-powers", "-largest-powers"] : ["", "-largest"];

    public IEnumerable<JsonElement> Groups => Values.GetProperty("group_tests").EnumerateArray();

    public static ReferenceCase Named(string name) => Cases.Value[name];

    private static Dictionary<string, ReferenceCase> LoadAll() =>
        Load("index.json").GetProperty("cases").EnumerateArray().Select(line => new ReferenceCase(line)).ToDictionary(one => one.Name);

    private static JsonElement Load(string relative)
    {
        using JsonDocument document = JsonDocument.Parse(ReferenceFiles.ReadText(relative));
        return document.RootElement.Clone();
    }
}
