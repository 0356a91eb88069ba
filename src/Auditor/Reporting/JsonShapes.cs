using System.Diagnostics.CodeAnalysis;
using System.Text.Json.Serialization;
using Auditor.Results;

namespace Auditor.Reporting;

/// <summary>
/// How the records' types are written, worked out when the program is built: at run time it took longer than the audit of a small dataset. Values of the policy
/// are objects, so the types they may have are named here.
/// </summary>
[JsonSourceGenerationOptions(GenerationMode = JsonSourceGenerationMode.Metadata)]
[JsonSerializable(typeof(AuditRecord))]
[JsonSerializable(typeof(SelfTestRecord))]
[JsonSerializable(typeof(long))]
[JsonSerializable(typeof(bool))]
[SuppressMessage("ApiDesign", "RS0030", Justification = "The banned calls are those of the framework's generator.")]
internal sealed partial class JsonShapes : JsonSerializerContext;
