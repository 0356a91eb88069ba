using System.Diagnostics.CodeAnalysis;

namespace Auditor.Policies;

/// <summary>How p-values are adjusted for the number of left-out groups.</summary>
public enum AdjustmentMethod
{
    Holm,
    Hochberg,
    BenjaminiHochberg,
    BenjaminiYekutieli,
    MaxT,
    Closed,
    None,
}

/// <summary>The test a verdict rests on when neither cluster nor time is declared.</summary>
public enum BasisWithoutStructure
{
    Hc3,
    Classical,
}

/// <summary>Rows of a group's test: complete for the final model and the group, or for the final model and every group.</summary>
public enum RowSet
{
    Own,
    Common,
}

/// <summary>
/// The thresholds and choices of an audit, after the firm's own values replaced the shipped ones. Made by <see cref="PolicyReader"/> only.
/// The fixed names are properties; every name, the fixed ones included, is found by <see cref="TryGet"/>.
/// </summary>
public sealed record Policy
{
    private readonly OrderedDictionary<string, PolicyValue> _values;

    /// <param name="values">Every value in the order of the shipped file; holds all fixed names, checked.</param>
    internal Policy(OrderedDictionary<string, PolicyValue> values)
    {
        _values = values;
        var effective = new OrderedDictionary<string, object>(values.Count, StringComparer.Ordinal);
        foreach (var (name, value) in values)
        {
            effective.Add(name, value.Shown);
        }

        Effective = effective;
    }

    /// <summary>Level of every test, above 0 and below 0.5.</summary>
    public double Significance => Number(PolicyNames.Significance);

    public AdjustmentMethod Adjustment => PolicyNames.Adjustments[Text(PolicyNames.Adjustment)];

    /// <summary>Partial R² below which a left-out group is held to be negligible.</summary>
    public double NegligiblePartialRSquared => Number(PolicyNames.NegligiblePartialRSquared);

    /// <summary>Power for which the rows needed are computed.</summary>
    public double Power => Number(PolicyNames.Power);

    public BasisWithoutStructure BasisWithoutStructure => PolicyNames.Bases[Text(PolicyNames.BasisWithoutStructure)];

    public RowSet RowSet => PolicyNames.RowSets[Text(PolicyNames.RowSet)];

    /// <summary>Denominator degrees of freedom below which no effect is shown to be negligible.</summary>
    public int NegligibleDf => (int)Number(PolicyNames.NegligibleDf);

    /// <summary>Parts of the rows above which a segment column is not divided by.</summary>
    public int MostParts => (int)Number(PolicyNames.MostParts);

    /// <summary>Rows below which no test is made in a part.</summary>
    public int PartRows => (int)Number(PolicyNames.PartRows);

    /// <summary>Every value under its name in the order of the file: a double, long, bool or string. What the record's "policy" shows.</summary>
    public IReadOnlyDictionary<string, object> Effective { get; }

    /// <summary>Names whose value is not the shipped one, with the shipped value.</summary>
    public IReadOnlyDictionary<string, object> Overridden { get; init; } = new Dictionary<string, object>();

    /// <summary>Every name in the order of the file.</summary>
    public IReadOnlyList<string> Names => [.. _values.Keys];

    /// <summary>The same with another level and bound, to see what would follow from them.</summary>
    internal Policy With(double significance, double bound)
    {
        var values = new OrderedDictionary<string, PolicyValue>(_values.Count, StringComparer.Ordinal);
        foreach (var (name, value) in _values)
        {
            values.Add(name, name switch
            {
                PolicyNames.Significance => value with { Number = significance },
                PolicyNames.NegligiblePartialRSquared => value with { Number = bound },
                _ => value,
            });
        }

        return new Policy(values);
    }

    public bool TryGet(string name, [NotNullWhen(true)] out PolicyValue? value) => _values.TryGetValue(name, out value);

    private double Number(string name) => _values[name].Number!.Value;

    private string Text(string name) => _values[name].Text!;
}
