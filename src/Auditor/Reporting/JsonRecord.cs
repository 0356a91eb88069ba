using System.Text;

namespace Auditor.Reporting;

/// <summary>Writes the record as JSON: UTF-8, snake case, full double precision, nulls written, the same bytes for the same record.</summary>
public static class JsonRecord
{
    private const string SchemaResource = "Auditor.Reporting.record.schema.json";

    /// <summary>The JSON Schema (draft 2020-12) that every written record satisfies.</summary>
    public static string Schema { get; } = ReadSchema();

    /// <exception cref="InvalidOperationException">A number of the record is NaN or infinite: a fault of the tool, since every value that cannot be computed is null.</exception>
    public static byte[] Write(AuditRecord record)
    {
        ArgumentNullException.ThrowIfNull(record);
        return JsonText.Write(record);
    }

    private static string ReadSchema()
    {
        using Stream stream = typeof(JsonRecord).Assembly.GetManifestResourceStream(SchemaResource)
            ?? throw new InvalidOperationException($"The assembly carries no resource {SchemaResource}.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }
}
