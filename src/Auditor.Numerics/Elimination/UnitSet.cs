using System.Globalization;

namespace Auditor.Numerics.Elimination;

/// <summary>A set of candidate units by position, as bits: the key of a submodel.</summary>
public readonly record struct UnitSet(UInt128 Bits)
{
    /// <summary>Most units that fit.</summary>
    public const int Most = 128;

    public static UnitSet All(int count) => new(count == Most ? UInt128.MaxValue : (UInt128.One << count) - 1);

    public static UnitSet Of(IEnumerable<int> units) => units.Aggregate(default(UnitSet), (set, unit) => new(set.Bits | (UInt128.One << unit)));

    public bool Contains(int unit) => (Bits >> unit & UInt128.One) != 0;

    public UnitSet Without(int unit) => new(Bits & ~(UInt128.One << unit));

    /// <summary>No unit of this set is missing from the other.</summary>
    public bool IsWithin(UnitSet other) => (Bits & ~other.Bits) == 0;

    public override string ToString() => Bits.ToString("X", CultureInfo.InvariantCulture);
}
