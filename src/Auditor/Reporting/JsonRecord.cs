using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace Auditor.Reporting;

/// <summary>Writes the record as JSON: UTF-8, snake case, full double precision, nulls written, the same bytes for the same record.</summary>
public static class JsonRecord
{
    private const string SchemaResource = "Auditor.Reporting.record.schema.json";

    private static readonly JsonSerializerOptions Options = MakeOptions();

    /// <summary>The JSON Schema (draft 2020-12) that every written record satisfies.</summary>
    public static string Schema { get; } = ReadSchema();

    /// <exception cref="InvalidOperationException">A number of the record is NaN or infinite: a fault of the tool, since every value that cannot be computed is null.</exception>
    public static byte[] Write(AuditRecord record)
    {
        ArgumentNullException.ThrowIfNull(record);
        try
        {
            return [.. JsonSerializer.SerializeToUtf8Bytes(record, Options), (byte)'\n'];
        }
        catch (JsonException notFinite)
        {
            throw new InvalidOperationException($"The record cannot be written: {notFinite.Message} (at {notFinite.Path})", notFinite);
        }
    }

    private static JsonSerializerOptions MakeOptions()
    {
        var options = new JsonSerializerOptions
        {
            PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
            WriteIndented = true,
            NewLine = "\n",
            // The record is a file of its own and is never pasted into a page, so R² may stay readable.
            Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
            Converters = { new JsonStringEnumConverter(JsonNamingPolicy.SnakeCaseLower), new FiniteNumber() },
        };
        options.MakeReadOnly(populateMissingResolver: true);
        return options;
    }

    private static string ReadSchema()
    {
        using Stream stream = typeof(JsonRecord).Assembly.GetManifestResourceStream(SchemaResource)
            ?? throw new InvalidOperationException($"The assembly carries no resource {SchemaResource}.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }

    /// <summary>Refuses NaN and infinities with a message; the serialiser adds the path.</summary>
    private sealed class FiniteNumber : JsonConverter<double>
    {
        public override double Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options) => reader.GetDouble();

        public override void Write(Utf8JsonWriter writer, double value, JsonSerializerOptions options)
        {
            if (!double.IsFinite(value))
            {
                throw new JsonException("a number is not finite, and only a null with its reason may stand for a value that cannot be computed");
            }

            writer.WriteNumberValue(value);
        }
    }
}
