namespace Auditor.Reporting;

/// <summary>Writes the record as JSON: UTF-8, snake case, full double precision, nulls written, the same bytes for the same record.</summary>
public static class JsonRecord
{
    /// <summary>The JSON Schema (draft 2020-12) that every written record satisfies.</summary>
    public static string Schema { get; } = EmbeddedText.Read("Auditor.Reporting.record.schema.json");

    /// <exception cref="InvalidOperationException">A number of the record is NaN or infinite: a fault of the tool, since every value that cannot be computed is null.</exception>
    public static byte[] Write(AuditRecord record)
    {
        ArgumentNullException.ThrowIfNull(record);
        return JsonText.Write(record);
    }
}
