namespace Auditor.Facts;

/// <summary>
/// The facts of one kind of subject: each is listed together with how it is read from a result, so that no fact can be listed
/// without a value or given without being listed.
/// </summary>
/// <typeparam name="T">The result, with whatever else the facts need.</typeparam>
internal sealed class FactFamily<T>(About about)
{
    private readonly List<(FactDefinition Definition, Func<T, FactValue> Value)> _facts = [];

    public IReadOnlyList<FactDefinition> Definitions => [.. _facts.Select(fact => fact.Definition)];

    /// <param name="why">Why there is no value, for the results that have none.</param>
    public FactFamily<T> Number(string name, string unit, string meaning, Func<T, double?> get, Func<T, string>? why = null) =>
        Add(FactType.Number, name, unit, meaning, source => FactValue.Of(get(source), Reason(source, why)));

    /// <inheritdoc cref="Number"/>
    public FactFamily<T> Count(string name, string unit, string meaning, Func<T, long?> get, Func<T, string>? why = null) =>
        Add(FactType.Count, name, unit, meaning, source => FactValue.Of(get(source), Reason(source, why)));

    /// <inheritdoc cref="Number"/>
    public FactFamily<T> Text(string name, string meaning, Func<T, string?> get, Func<T, string>? why = null) =>
        Add(FactType.Text, name, FactUnits.None, meaning, source => FactValue.Of(get(source), Reason(source, why)));

    /// <summary>A text that is one of a few words.</summary>
    public FactFamily<T> Word(string name, string meaning, IReadOnlyList<string> words, Func<T, string?> get, Func<T, string>? why = null)
    {
        Text(name, meaning, get, why);
        var (definition, value) = _facts[^1];
        _facts[^1] = (definition with { Words = words }, value);
        return this;
    }

    /// <inheritdoc cref="Number"/>
    public FactFamily<T> Flag(string name, string meaning, Func<T, bool?> get, Func<T, string>? why = null) =>
        Add(FactType.Flag, name, FactUnits.None, meaning, source => FactValue.Of(get(source), Reason(source, why)));

    public FactSet From(T source, string subject, int? line)
    {
        var values = new OrderedDictionary<string, FactValue>(StringComparer.Ordinal);
        foreach (var (definition, value) in _facts)
        {
            values.Add(definition.Name, value(source));
        }

        return new FactSet(about, subject, line, values);
    }

    private static string Reason(T source, Func<T, string>? why) => why?.Invoke(source) ?? "no value was given";

    private FactFamily<T> Add(FactType type, string name, string unit, string meaning, Func<T, FactValue> value)
    {
        _facts.Add((new FactDefinition(about, name, type, unit, meaning), value));
        return this;
    }
}
