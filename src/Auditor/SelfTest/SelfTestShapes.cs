using System.Diagnostics.CodeAnalysis;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace Auditor.SelfTest;

/// <summary>How the files of the self-test are read, worked out when the program is built.</summary>
[JsonSourceGenerationOptions(JsonSerializerDefaults.Web, GenerationMode = JsonSourceGenerationMode.Metadata)]
[JsonSerializable(typeof(SelfTestPlan))]
[JsonSerializable(typeof(Dictionary<string, Dictionary<string, int>>), TypeInfoPropertyName = "Floors")]
[SuppressMessage("ApiDesign", "RS0030", Justification = "The banned calls are those of the framework's generator.")]
internal sealed partial class SelfTestShapes : JsonSerializerContext;
