using Auditor.Numerics.Elimination;
using Auditor.Numerics.Random;

namespace Auditor.Numerics.Tests.Elimination;

/// <summary>Drawn data with units of one and two correlated columns: intercept forced, the given units kept, the rest left out.</summary>
internal sealed class RandomElimination
{
    private readonly double[][][] _units;

    public RandomElimination(Generator random, int n, int[] widths, double[] effects)
    {
        var shared = Normals(random, n);
        _units = [.. widths.Select(width => Enumerable.Range(0, width).Select(_ => Normals(random, n).Zip(shared, (own, common) => own + (0.7 * common)).ToArray()).ToArray())];
        Ones = [.. Enumerable.Repeat(1.0, n)];
        Y = [.. Enumerable.Range(0, n).Select(i => 3 + random.Normal() + _units.Select((unit, u) => effects[u] * unit[0][i]).Sum())];
    }

    public double[] Ones { get; }

    public double[] Y { get; set; }

    public static double[] Normals(Generator random, int n) => [.. Enumerable.Range(0, n).Select(_ => random.Normal())];

    public NaiveElimination Naive(int[] kept, DroppingCriterion criterion, double bound) => new([Ones], Ordered(kept), criterion, bound);

    /// <summary>Units in the order kept, left out; each keeps its columns.</summary>
    public double[][][] Ordered(int[] kept) => [.. kept.Concat(Enumerable.Range(0, _units.Length).Except(kept)).Select(unit => _units[unit])];

    /// <summary>The same for the project: kept units must have one column each.</summary>
    public EliminationCase Case(int[] kept, double[]? weights = null, double[]? copies = null)
    {
        var ordered = Ordered(kept);
        return new EliminationCase(
            new MatrixDesign(true, [.. ordered.Take(kept.Length).Select(unit => unit[0])], ordered[kept.Length..], Y, weights, copies), forced: 1);
    }
}
