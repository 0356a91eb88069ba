namespace Auditor.Facts;

public enum FactType
{
    Number,

    /// <summary>A whole number of things.</summary>
    Count,

    Text,

    /// <summary>True or false.</summary>
    Flag,
}

/// <summary>A fact as the catalogue lists it: rules may name it, and messages may show it.</summary>
/// <param name="Unit">One of <see cref="FactUnits"/>, or the name of what is counted; empty when there is none.</param>
/// <param name="Meaning">One sentence.</param>
public sealed record FactDefinition(About About, string Name, FactType Type, string Unit, string Meaning)
{
    /// <summary>The only words the fact can be, so that a misspelt one in a rule is noticed; empty for free text and other types.</summary>
    public IReadOnlyList<string> Words { get; init; } = [];
}

/// <summary>Units that decide how a number is shown.</summary>
public static class FactUnits
{
    public const string None = "";

    /// <summary>A probability of a test: never shown as 0.</summary>
    public const string P = "p";

    /// <summary>0 to 1, shown as a percentage.</summary>
    public const string Share = "share";

    /// <summary>0 to 1, shown as it is.</summary>
    public const string Probability = "probability";

    public const string Rows = "rows";

    public const string Columns = "columns";

    public const string Clusters = "clusters";

    public const string DegreesOfFreedom = "df";

    public const string Digits = "decimal digits";

    public const string PartialRSquared = "partial R²";
}
