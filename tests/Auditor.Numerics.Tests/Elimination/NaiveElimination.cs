using Auditor.Numerics.Distributions;
using Auditor.Numerics.Elimination;

namespace Auditor.Numerics.Tests.Elimination;

/// <summary>
/// Backward elimination the slow way, for comparison: every model refitted from its columns by Gram and Schmidt, sums of squares as differences of two
/// residual sums of squares. Shares with the project only the F law. Columns must be well apart.
/// </summary>
internal sealed class NaiveElimination(double[][] forced, double[][][] units, DroppingCriterion criterion, double bound)
{
    public static double[] Residual(IEnumerable<double[]> columns, double[] y)
    {
        var basis = new List<double[]>();
        foreach (var column in columns)
        {
            var rest = Swept(basis, Swept(basis, column));
            var length = Math.Sqrt(Dot(rest, rest));
            basis.Add([.. rest.Select(value => value / length)]);
        }

        return Swept(basis, Swept(basis, y));
    }

    public static double Dot(double[] a, double[] b) => a.Zip(b, (x, y) => x * y).Sum();

    /// <summary>The units left at the end, ascending, and those dropped in order.</summary>
    public (int[] Kept, int[] Dropped) Run(double[] y)
    {
        var (inside, dropped) = (Enumerable.Range(0, units.Length).ToList(), new List<int>());
        while (Next(inside, y) is int unit)
        {
            inside.Remove(unit);
            dropped.Add(unit);
        }

        return ([.. inside], [.. dropped]);
    }

    private static double[] Swept(List<double[]> basis, double[] column)
    {
        var rest = column.ToArray();
        foreach (var direction in basis)
        {
            var share = Dot(direction, rest);
            rest = [.. rest.Zip(direction, (value, d) => value - (share * d))];
        }

        return rest;
    }

    private int? Next(List<int> inside, double[] y)
    {
        var (n, rank) = ((double)y.Length, forced.Length + inside.Sum(unit => units[unit].Length));
        var rss = Rss(inside, y);
        var (best, value) = ((int?)null, criterion == DroppingCriterion.PartialF ? bound : 0.0);
        foreach (var unit in inside)
        {
            var (q, without) = (units[unit].Length, Rss(inside.Where(other => other != unit), y));
            var measure = criterion == DroppingCriterion.PartialF
                ? FisherF.Survival((without - rss) / q / (rss / (n - rank)), q, n - rank)
                : (n * Math.Log(rss / without)) + (q * (criterion == DroppingCriterion.Aic ? 2 : Math.Log(n)));
            if (measure > value)
            {
                (best, value) = (unit, measure);
            }
        }

        return best;
    }

    private double Rss(IEnumerable<int> inside, double[] y)
    {
        var residual = Residual(forced.Concat(inside.SelectMany(unit => units[unit])), y);
        return Dot(residual, residual);
    }
}
