namespace Auditor.Facts;

/// <summary>All facts of one subject.</summary>
/// <param name="Subject">Whom they are about, as a finding names it.</param>
/// <param name="Line">Line of the declaration, where the subject has one.</param>
/// <param name="Values">Every fact of the family by name.</param>
public sealed record FactSet(About About, string Subject, int? Line, IReadOnlyDictionary<string, FactValue> Values)
{
    public FactValue this[string name] => Values[name];
}
