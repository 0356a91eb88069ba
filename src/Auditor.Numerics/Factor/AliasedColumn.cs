namespace Auditor.Numerics.Factor;

/// <summary>A column of the design that is a combination of earlier kept ones.</summary>
/// <param name="Column">Its index in the design.</param>
/// <param name="Constant">The constant of the combination, in the column's own units (0 without an intercept).</param>
/// <param name="Parts">Columns and their coefficients; none when the column is constant or zero.</param>
public sealed record AliasedColumn(int Column, double Constant, IReadOnlyList<CombinationPart> Parts);

public readonly record struct CombinationPart(int Column, double Coefficient);

/// <summary>A column that is nearly such a combination: it was kept, but about so many decimal digits are lost.</summary>
public sealed record NearlyAliasedColumn(int Column, double DigitsLost);
