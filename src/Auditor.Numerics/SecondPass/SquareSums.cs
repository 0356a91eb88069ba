namespace Auditor.Numerics.SecondPass;

/// <summary>Sums in square matrices.</summary>
internal static class SquareSums
{
    /// <summary>into += other, entry by entry; both q x q.</summary>
    public static void Add(double[,] into, double[,] other)
    {
        for (var a = 0; a < into.GetLength(0); a++)
        {
            for (var b = 0; b < into.GetLength(1); b++)
            {
                into[a, b] += other[a, b];
            }
        }
    }
}
