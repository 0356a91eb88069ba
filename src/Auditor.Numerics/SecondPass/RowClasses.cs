namespace Auditor.Numerics.SecondPass;

/// <summary>Rows sorted into classes: clusters, units, or periods in time order.</summary>
/// <param name="Codes">For each of n rows its class, 0 to <paramref name="Count"/> - 1; every class has a row.</param>
public sealed record RowClasses(int[] Codes, int Count);
