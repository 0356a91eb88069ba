namespace Auditor.Yaml;

/// <summary>A map whose keys are known by name: unknown and missing keys are problems.</summary>
internal sealed class Keys
{
    private readonly Place _place;
    private readonly Dictionary<string, MapEntry> _entries;

    /// <summary>The known keys that a misspelt one was probably meant to be: it is not also reported as missing.</summary>
    private readonly HashSet<string> _suggested = [];

    private Keys(Place place, MapValue map)
    {
        _place = place;
        _entries = map.Entries.ToDictionary(entry => entry.Key, StringComparer.Ordinal);
    }

    public int Line => _place.Line;

    /// <summary>The keys of a map, null with a problem when it is no map.</summary>
    public static Keys? Of(Place place, params IReadOnlyList<string> known)
    {
        if (place.Node is not MapValue map)
        {
            place.Refuse("a map with " + (known.Count == 1 ? "the key " : "the keys ") + string.Join(", ", known));
            return null;
        }

        var keys = new Keys(place, map);
        keys.RefuseUnknown(known);
        return keys;
    }

    public bool Has(string key) => _entries.ContainsKey(key);

    /// <summary>Which of these keys there are.</summary>
    public IReadOnlyList<string> Present(params IReadOnlyList<string> keys) => [.. keys.Where(Has)];

    /// <summary>Says that another choice of keys was expected, unless a misspelt one explains what is missing.</summary>
    public void RefuseChoice(string expected, IReadOnlyList<string> keys)
    {
        if (!_suggested.Overlaps(keys))
        {
            Add($"expected {expected}, found {Words.NoneOr(Present(keys))}");
        }
    }

    public Place? Optional(string key) => _entries.TryGetValue(key, out var entry) ? At(entry) : null;

    /// <summary>The value of a key that must be there.</summary>
    /// <param name="expected">What it would hold, for the message.</param>
    public Place? Required(string key, string expected)
    {
        var found = Optional(key);
        if (found is null && !_suggested.Contains(key))
        {
            _place.Add($"'{key}' is missing; expected {expected}");
        }

        return found;
    }

    public void Add(string message) => _place.Add(message);

    private Place At(MapEntry entry)
    {
        var path = _place.IsDocument ? entry.Key : _place.Path + "." + entry.Key;
        // A key with nothing after it is reported where the key stands, not where the parser noticed.
        var node = entry.Value is TextValue { IsPlain: true, Text: "" } nothing ? nothing with { Line = entry.Line } : entry.Value;
        return new Place(node, path, _place.Problems);
    }

    private static string Known(IReadOnlyList<string> known) =>
        known.Count == 1 ? "; the only key is " + known[0] : "; the keys are " + string.Join(", ", known);

    private void RefuseUnknown(IReadOnlyList<string> known)
    {
        foreach (var entry in _entries.Values.Where(entry => !known.Contains(entry.Key)))
        {
            var near = NearestName.Of(entry.Key, known);
            _suggested.UnionWith(near is null ? [] : [near]);
            var hint = near is null ? Known(known) : $"; did you mean '{near}'?";
            _place.Problems.Add(entry.Line, $"{_place.Path}: unknown key '{Words.Short(entry.Key)}'{hint}");
        }
    }
}
