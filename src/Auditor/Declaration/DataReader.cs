using System.Text.RegularExpressions;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>data</c>.</summary>
internal sealed partial class DataReader(ColumnNames columns)
{
    /// <summary>The paths as written, also when something else is wrong.</summary>
    public IReadOnlyList<string> Sources { get; private set; } = [];

    public DataDeclaration? Read(Place place)
    {
        if (Keys.Of(
                place,
                ["source", "sha256", "columns", "missing", "keep", "row_label", "time", "period", "unit", "serial_lag", "split", "cluster", "weights", "segments"])
            is not { } keys)
        {
            return null;
        }

        var source = keys.Required("source", "a file, a list of files or a folder");
        Sources = source is null ? [] : ReadSources(source);
        return new DataDeclaration(
            Sources,
            source?.Line ?? place.Line,
            keys.Optional("sha256") is { } hash ? Sha256(hash) : null,
            keys.Optional("columns") is { } kinds ? ColumnsReader.Read(kinds, columns) : new Dictionary<string, ColumnDeclaration>(),
            keys.Optional("missing") is { } missing ? Missing(missing) : DataDeclaration.DefaultMissing,
            keys.Optional("keep") is { } keep ? new KeepReader(columns).Read(keep) : [],
            keys.Optional("row_label") is { } label ? columns.Read(label, "data.row_label") : null,
            keys.Optional("weights") is { } weights ? Weights(weights) : null,
            new StructureReader(columns).Read(keys));
    }

    private static IReadOnlyList<string> ReadSources(Place place)
    {
        if (place.Node is not ListValue)
        {
            return place.Text("a file, a list of files or a folder") is { } one ? [one] : [];
        }

        return Distinct.Texts(place.Items("files", least: 1) ?? [], "file", item => item.Text("a file"));
    }

    private static string? Sha256(Place place)
    {
        if (place.Node is TextValue { Text: var text } && Hash().IsMatch(text))
        {
            return text.ToLowerInvariant();
        }

        place.Refuse("64 hexadecimal digits");
        return null;
    }

    private static IReadOnlyList<string> Missing(Place place)
    {
        if (place.IsNothing)
        {
            place.Refuse("a list of texts");
            return [];
        }

        return Distinct.Texts(place.Items("texts") ?? [], "text", item => item.AnyText());
    }

    private WeightsDeclaration? Weights(Place place)
    {
        if (Keys.Of(place, "column", "kind") is not { } keys)
        {
            return null;
        }

        var column = keys.Required("column", "a column name") is { } named ? columns.Read(named, "data.weights") : null;
        var kind = keys.Required("kind", "precision, frequency or sampling, which lead to different formulas")
            ?.OneOf(("precision", WeightKind.Precision), ("frequency", WeightKind.Frequency), ("sampling", WeightKind.Sampling));
        return column is null || kind is not WeightKind meaning ? null : new WeightsDeclaration(column.Column, meaning, column.Line);
    }

    [GeneratedRegex(@"\A[0-9A-Fa-f]{64}\z", RegexOptions.CultureInvariant)]
    private static partial Regex Hash();
}
