using System.Text.Json;
using Auditor.Reporting;
using Json.Schema;

namespace Auditor.Tests.Reporting;

/// <summary>Holds a record against the schema that ships with the tool.</summary>
internal static class RecordSchema
{
    private static readonly JsonSchema Schema = JsonSchema.FromText(JsonRecord.Schema);

    public static List<string> Faults(JsonElement record)
    {
        EvaluationResults results = Schema.Evaluate(record, new EvaluationOptions { OutputFormat = OutputFormat.List, RequireFormatValidation = true });
        return results.IsValid
            ? []
            : [.. (results.Details ?? []).Where(detail => detail.Errors is not null).Select(detail => $"{detail.InstanceLocation}: {string.Join("; ", detail.Errors!.Values)}")];
    }

    public static void AssertValid(JsonElement record) => Assert.Empty(Faults(record));
}
