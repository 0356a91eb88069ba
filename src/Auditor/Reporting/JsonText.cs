using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;
using Auditor.Findings;
using Auditor.Results;

namespace Auditor.Reporting;

/// <summary>Writes values as JSON: UTF-8, snake case, full double precision, nulls written, the same bytes for the same value.</summary>
internal static class JsonText
{
    private static readonly JsonShapes Shapes = new(new JsonSerializerOptions
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        WriteIndented = true,
        NewLine = "\n",
        // The record is a file of its own and is never pasted into a page, so R² may stay readable.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        Converters = { new JsonStringEnumConverter<Severity>(JsonNamingPolicy.SnakeCaseLower), new FiniteNumber() },
    });

    /// <exception cref="InvalidOperationException">A number is NaN or infinite: a fault of the tool, since every value that cannot be computed is null.</exception>
    public static byte[] Write(AuditRecord record) => Write(record, Shapes.AuditRecord);

    /// <inheritdoc cref="Write(AuditRecord)"/>
    public static byte[] Write(SelfTestRecord record) => Write(record, Shapes.SelfTestRecord);

    private static byte[] Write<T>(T value, JsonTypeInfo<T> shape)
    {
        try
        {
            return [.. JsonSerializer.SerializeToUtf8Bytes(value, shape), (byte)'\n'];
        }
        catch (JsonException notFinite)
        {
            throw new InvalidOperationException($"The record cannot be written: {notFinite.Message} (at {notFinite.Path})", notFinite);
        }
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
