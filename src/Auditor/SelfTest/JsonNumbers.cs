using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>Numbers out of JSON: null for null, an error for a name that is not there.</summary>
internal static class JsonNumbers
{
    /// <summary>The number under a name, with the logarithm that may stand beside it.</summary>
    public static Quantity? Number(this JsonElement? element, string name, string? logarithm = null) =>
        element is { ValueKind: JsonValueKind.Object } owner ? owner.Number(name, logarithm) : null;

    public static Quantity? Number(this JsonElement element, string name, string? logarithm = null)
    {
        if (element.ValueKind == JsonValueKind.Null)
        {
            return null;
        }

        if (!element.TryGetProperty(name, out JsonElement value))
        {
            throw new KeyNotFoundException($"no \"{name}\" in {Start(element)}");
        }

        return value.ValueKind switch
        {
            JsonValueKind.Null => null,
            JsonValueKind.String => Quantity.Parse(value.GetString()!),
            _ => new Quantity(value.GetDouble(), logarithm is null ? null : element.Optional(logarithm)?.GetDouble()),
        };
    }

    /// <summary>The element under a name; null when it is absent or null.</summary>
    public static JsonElement? Optional(this JsonElement element, string name) =>
        element.ValueKind == JsonValueKind.Object && element.TryGetProperty(name, out JsonElement value) && value.ValueKind != JsonValueKind.Null ? value : null;

    public static JsonElement? Optional(this JsonElement? element, string name) => element?.Optional(name);

    public static string Text(this JsonElement element, string name) => element.GetProperty(name).GetString()!;

    public static IReadOnlyList<string> Texts(this JsonElement element, string name) =>
        [.. element.GetProperty(name).EnumerateArray().Select(item => item.GetString()!)];

    /// <summary>The object of an array whose <paramref name="key"/> has this text; null when none has.</summary>
    public static JsonElement? Find(this JsonElement array, string key, string text) =>
        array.EnumerateArray().Where(item => item.Text(key) == text).Cast<JsonElement?>().FirstOrDefault();

    private static string Start(JsonElement element)
    {
        string text = element.GetRawText();
        return text.Length <= 120 ? text : text[..120] + "…";
    }
}
