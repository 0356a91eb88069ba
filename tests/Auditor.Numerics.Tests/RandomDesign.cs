using CsCheck;

namespace Auditor.Numerics.Tests;

/// <summary>Random data for property tests: an x, a group of two columns, levels, a response.</summary>
internal sealed record RandomDesign(double[] X, double[] Z1, double[] Z2, int[] Level, double[] Y)
{
    public const int Levels = 3;

    public static Gen<RandomDesign> Any =>
        from n in Gen.Int[14, 40]
        from x in Gen.Double[-3, 3].Array[n]
        from z1 in Gen.Double[-3, 3].Array[n]
        from z2 in Gen.Double[-3, 3].Array[n]
        from level in Gen.Int[0, Levels - 1].Array[n]
        from noise in Gen.Double[-2, 2].Array[n]
        select new RandomDesign(x, z1, z2, EveryLevel(level), [.. noise.Select((value, i) => 1 + x[i] + (0.3 * z1[i]) + value)]);

    public int N => Y.Length;

    /// <summary>Treatment coding with the given level as reference.</summary>
    public double[][] Coded(int reference) =>
        [.. Enumerable.Range(0, Levels).Where(level => level != reference).Select(level => Level.Select(l => l == level ? 1.0 : 0).ToArray())];

    /// <summary>Every level twice at least, so that no row is alone in its level.</summary>
    private static int[] EveryLevel(int[] level)
    {
        for (var l = 0; l < 2 * Levels; l++)
        {
            level[l] = l % Levels;
        }

        return level;
    }
}
