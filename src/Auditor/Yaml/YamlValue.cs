namespace Auditor.Yaml;

/// <summary>A piece of a YAML file with the line it starts on. Text stays as written: what it means is decided by the key it stands under.</summary>
/// <param name="Line">1-based.</param>
/// <param name="Size">How many values it holds, itself included, with every alias written out.</param>
/// <param name="Depth">How many levels it nests: 1 for a text.</param>
internal abstract record YamlValue(int Line, long Size, int Depth);

/// <param name="IsPlain">Written without quotes.</param>
internal sealed record TextValue(string Text, bool IsPlain, int Line) : YamlValue(Line, 1, 1);

internal sealed record ListValue(IReadOnlyList<YamlValue> Items, int Line)
    : YamlValue(Line, 1 + Items.Sum(item => item.Size), 1 + Items.Select(item => item.Depth).DefaultIfEmpty().Max());

internal sealed record MapValue(IReadOnlyList<MapEntry> Entries, int Line)
    : YamlValue(Line, 1 + Entries.Sum(entry => 1 + entry.Value.Size), 1 + Entries.Select(entry => entry.Value.Depth).DefaultIfEmpty().Max());

internal sealed record MapEntry(string Key, int Line, YamlValue Value);
