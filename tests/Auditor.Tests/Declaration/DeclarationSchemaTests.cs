using System.Text.Json;
using System.Text.Json.Nodes;
using Auditor.Declaration;
using Auditor.Tests.Yaml;
using Json.Schema;

namespace Auditor.Tests.Declaration;

public sealed class DeclarationSchemaTests
{
    private const string Unknown = "zzzzzzzzzzzzzzzzzzzzzzzz";
    private static readonly JsonSchema Schema = JsonSchema.FromText(DeclarationSchema.Text);
    private static readonly JsonObject Written = JsonNode.Parse(DeclarationSchema.Text)!.AsObject();

    /// <summary>Where each map of known keys stands in a declaration (the line that replaces or follows those of the least one) and in the schema.</summary>
    public static TheoryData<string, string> Maps => new()
    {
        { "zzz: 1", "" },
        { "model: {id: lease, zzz: 1}", "properties/model" },
        { "data: {source: leases.csv, zzz: 1}", "$defs/data" },
        { "data: {source: leases.csv, columns: {region: {zzz: 1}}}", "$defs/columnKind" },
        { "data: {source: leases.csv, keep: [{zzz: 1}]}", "$defs/condition" },
        { "data: {source: leases.csv, time: {zzz: 1}}", "$defs/data/properties/time/anyOf/1" },
        { "data: {source: leases.csv, split: {zzz: 1}}", "$defs/data/properties/split" },
        { "data: {source: leases.csv, weights: {zzz: 1}}", "$defs/data/properties/weights" },
        { "final_model: {terms: [], zzz: 1}", "properties/final_model" },
        { "left_out: [{zzz: 1}]", "$defs/group" },
        { "left_out: [{group: g, terms: [a], reported: {zzz: 1}}]", "$defs/reportedTest" },
        { "elimination: {zzz: 1}", "$defs/elimination" },
        { "elimination: {rule: {zzz: 1}}", "$defs/elimination/properties/rule" },
        { "elimination: {rule: {drop_above: 0.05}, steps: [{zzz: 1}]}", "$defs/elimination/properties/steps/items" },
        { "reported: {zzz: 1}", "$defs/reportedModel" },
        { "reported: {coefficients: {price: {zzz: 1}}}", "$defs/reportedCoefficient" },
        { "response: {zzz: 1}", "$defs/term/anyOf/1" },
        { "response: {log: {of: price, zzz: 1}}", "$defs/shifted" },
        { "response: {center: {of: price, zzz: 1}}", "$defs/centered" },
        { "response: {power: {zzz: 1}}", TermKind("power") },
        { "response: {winsorise: {zzz: 1}}", TermKind("winsorise") },
        { "response: {cap: {zzz: 1}}", TermKind("cap") },
        { "response: {polynomial: {zzz: 1}}", TermKind("polynomial") },
        { "response: {spline: {zzz: 1}}", TermKind("spline") },
        { "response: {bins: {zzz: 1}}", TermKind("bins") },
        { "response: {indicator: {zzz: 1}}", TermKind("indicator") },
        { "response: {step: {zzz: 1}}", TermKind("step") },
        { "response: {pulse: {zzz: 1}}", TermKind("pulse") },
        { "response: {season: {zzz: 1}}", TermKind("season") },
        { "response: {lag: {zzz: 1}}", TermKind("lag") },
        { "response: {change: {zzz: 1}}", TermKind("change") },
        { "response: {moving_average: {zzz: 1}}", TermKind("moving_average") },
    };

    [Theory]
    [MemberData(nameof(Maps))]
    public void The_reader_and_the_schema_know_the_same_keys(string line, string pointer)
    {
        var message = Declared.Problems(line.Replace("zzz", Unknown, StringComparison.Ordinal)).Single(problem => problem.Contains($"'{Unknown}'", StringComparison.Ordinal));
        var read = message[(message.LastIndexOf(';') + 1)..].Replace("the only key is", "", StringComparison.Ordinal).Replace("the keys are", "", StringComparison.Ordinal)
            .Replace("the terms are", "", StringComparison.Ordinal).Split(',', StringSplitOptions.TrimEntries);

        Assert.Equal(read.Order(StringComparer.Ordinal), Keys(At(pointer)).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void No_map_of_the_schema_is_left_out_of_the_comparison()
    {
        string[] compared = [.. Maps.Select(row => row.Data.Item2)];

        Assert.Equal(compared.Order(StringComparer.Ordinal), MapsIn(Written, "").Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Every_key_is_described()
    {
        var described = MapsIn(Written, "").SelectMany(pointer => At(pointer)["properties"]!.AsObject()).ToList();

        Assert.True(described.Count > 100, $"{described.Count} keys");
        Assert.All(described, pair => Assert.True(Description(pair.Value!) is { Length: > 1 }, pair.Key));
    }

    [Fact]
    public void A_declaration_with_every_key_and_term_is_valid() => AssertValid(FullDeclaration.Yaml);

    [Fact]
    public void The_demo_is_valid() => AssertValid(File.ReadAllText(Path.Combine(TestFolders.Demo, "declaration.yaml")));

    [Fact]
    public void Every_reference_declaration_is_valid()
    {
        var files = Directory.GetFiles(TestFolders.Reference, "declaration*.yaml", SearchOption.AllDirectories);

        Assert.InRange(files.Length, 46, int.MaxValue);
        Assert.All(files, file => AssertValid(File.ReadAllText(file)));
    }

    [Theory]
    [InlineData("left_out:")]
    [InlineData("final_model:\n  terms:")]
    [InlineData("data: {source: leases.csv, columns: , keep: , segments: }")]
    [InlineData("data: {source: leases.csv, time: {file_order: true}, split: {row: 60}}")]
    [InlineData("data: {source: leases.csv, segments: region}")]
    [InlineData("elimination: {rule: {judgement: signs}}")]
    [InlineData("response: 2008")]
    [InlineData("response: {log: {of: {ratio: [a, b]}, plus: 1}}")]
    public void What_the_reader_takes_is_valid(string line)
    {
        Declared.Good(line);
        AssertValid(Declared.With(line));
    }

    [Theory]
    [InlineData("leftout: []")]
    [InlineData("audit: 2")]
    [InlineData("model: {id: ../lease}")]
    [InlineData("model: {titel: x, id: lease}")]
    [InlineData("data: {source: leases.csv, sha256: abc}")]
    [InlineData("data: {source: leases.csv, columns: {region: {kind: level}}}")]
    [InlineData("data: {source: leases.csv, columns: {region: {}}}")]
    [InlineData("data: {source: leases.csv, keep: [{column: a, equals: 1, not: 2}]}")]
    [InlineData("data: {source: leases.csv, weights: {column: w}}")]
    [InlineData("data: {source: leases.csv, period: month}")]
    [InlineData("data: {source: leases.csv, split: {column: a, row: 3}}")]
    [InlineData("response: {lgo: price}")]
    [InlineData("response: {log: price, sqrt: price}")]
    [InlineData("response: [price]")]
    [InlineData("final_model: {intercept: maybe, terms: [a]}")]
    [InlineData("final_model: {terms: a}")]
    [InlineData("final_model: {terms: [{product: [a]}]}")]
    [InlineData("final_model: {terms: [{power: {of: a, exponent: 0}}]}")]
    [InlineData("final_model: {terms: [{cap: {of: a}}]}")]
    [InlineData("left_out: [{group: g, terms: []}]")]
    [InlineData("left_out: [{group: g, terms: [a], reported: {p: small}}]")]
    [InlineData("elimination: {rule: {drop_above: 5}}")]
    [InlineData("reported: {}")]
    public void What_is_wrong_fails_as_it_does_in_the_reader(string line)
    {
        Declared.Problems(line);
        Assert.False(Result(Declared.With(line)).IsValid);
    }

    private static string TermKind(string name) => "$defs/term/anyOf/1/properties/" + name;

    private static JsonNode At(string pointer) => pointer.Split('/', StringSplitOptions.RemoveEmptyEntries)
        .Aggregate((JsonNode)Written, (node, step) => node is JsonArray list ? list[step[0] - '0']! : node[step]!);

    private static IEnumerable<string> Keys(JsonNode map) => map["properties"]!.AsObject().Select(pair => pair.Key);

    /// <summary>Every place of the schema that lists the keys of a map. (A condition on other keys lists none.)</summary>
    private static IEnumerable<string> MapsIn(JsonNode? node, string pointer)
    {
        var below = node switch
        {
            JsonObject map => map.Select(pair => (pair.Key, pair.Value)),
            JsonArray list => list.Select((value, index) => (Key: index.ToString(System.Globalization.CultureInfo.InvariantCulture), Value: value)),
            _ => [],
        };
        string[] here = node is JsonObject { } asked && asked.ContainsKey("additionalProperties") && asked.ContainsKey("properties") ? [pointer] : [];
        return [.. here, .. below.SelectMany(pair => MapsIn(pair.Value, pointer.Length == 0 ? pair.Key : pointer + "/" + pair.Key))];
    }

    private static string? Description(JsonNode schema) => (string?)(schema["description"] ?? (schema["$ref"] is { } target ? At(((string)target!)[2..])["description"] : null));

    private static void AssertValid(string yaml)
    {
        var result = Result(yaml);
        Assert.True(result.IsValid, JsonSerializer.Serialize(result));
    }

    private static EvaluationResults Result(string yaml) =>
        Schema.Evaluate(JsonSerializer.SerializeToElement(YamlToJson.Of(yaml)), new EvaluationOptions { OutputFormat = OutputFormat.List });
}
