using System.Text.RegularExpressions;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>model</c>: who the model is.</summary>
internal static partial class ModelReader
{
    private const string Id = "1 to 100 letters a to z, digits and hyphens, not starting with a hyphen";

    public static ModelIdentity? Read(Place place)
    {
        if (Keys.Of(place, "id", "title", "version", "prepared_by") is not { } keys)
        {
            return null;
        }

        var id = keys.Required("id", Id) is { } named ? ReadId(named) : null;
        var title = keys.Optional("title")?.Text();
        var version = keys.Optional("version")?.Text();
        var preparedBy = keys.Optional("prepared_by")?.Text();
        return id is null ? null : new ModelIdentity(id, title, version, preparedBy);
    }

    /// <summary>The id names the output files, so nothing that could lead out of their folder or surprise a file system.</summary>
    private static string? ReadId(Place place)
    {
        if (place.Node is TextValue { Text: var text } && FileName().IsMatch(text))
        {
            return text;
        }

        place.Refuse(Id);
        return null;
    }

    [GeneratedRegex(@"\A[A-Za-z0-9][A-Za-z0-9-]{0,99}\z", RegexOptions.CultureInvariant)]
    private static partial Regex FileName();
}
