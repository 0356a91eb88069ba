using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;

namespace Auditor.Simulation.Bases;

/// <summary>How a group's columns vary.</summary>
internal enum ClusterColumns
{
    /// <summary>One value a cluster.</summary>
    Constant,

    /// <summary>Half of the variance between clusters, half within.</summary>
    Varying,

    /// <summary>1 in three clusters, 0 in all others; q = 1 only.</summary>
    ThreeClusters,
}

/// <param name="Variance">Of a cluster's common error, given its value of the first column.</param>
/// <param name="Draw">A number of mean 0 and variance 1.</param>
internal sealed record ClusterLaw(string Name, Func<double, double> Variance, Func<Generator, double> Draw)
{
    public static IReadOnlyList<ClusterLaw> All { get; } =
    [
        new("normal", _ => 1, g => g.Normal()),
        new("normal, cluster variance exp(z)", Math.Exp, g => g.Normal()),
        new("skewed cluster part", _ => 1, ErrorLaw.All[7].Draw),
    ];
}

/// <summary>Unbalanced clusters of 3, 5, 8, 12 and 22 rows; 0.3 of the errors' variance is common to a cluster.</summary>
internal sealed class ClusterSetting : Setting
{
    private const double Common = 0.3;

    private static readonly int[] Sizes = [3, 5, 8, 12, 22];

    private readonly ClusterLaw _law;
    private readonly ClusterColumns _kind;
    private readonly int[] _codes;

    public ClusterSetting(ClusterLaw law, ClusterColumns kind, int clusters, IReadOnlyList<int> widths, params IReadOnlyList<string> labels)
        : this(law, kind, [.. Enumerable.Range(0, clusters).SelectMany(c => Enumerable.Repeat(c, Sizes[c % Sizes.Length]))], widths, labels)
    {
    }

    private ClusterSetting(ClusterLaw law, ClusterColumns kind, int[] codes, IReadOnlyList<int> widths, IReadOnlyList<string> labels)
        : base(labels, codes.Length, widths)
    {
        (_law, _kind, _codes) = (law, kind, codes);
        Structure = new DependenceStructure { Cluster = new RowClasses(codes, codes[^1] + 1) };
    }

    public override DependenceStructure? Structure { get; }

    private int Clusters => _codes[^1] + 1;

    public override double Draw(Generator random, DrawnRows into)
    {
        Array.Fill(into.Columns[0], 1);
        Fill(random, into.Columns[1], Normals(random), 0.5);
        Fill(random, into.Columns[2], Normals(random), 1);
        FillIndicator(random, into.Columns[3], 0.3);
        var first = Array.Empty<double>();
        foreach (var (column, position) in into.Groups)
        {
            var between = Between(random, position);
            first = position == 0 ? between : first;
            Fill(random, column, between, _kind == ClusterColumns.Varying ? 0.5 : 1);
        }

        return DrawErrors(random, into.Errors, first);
    }

    private double DrawErrors(Generator random, double[] errors, double[] first)
    {
        double[] variances = [.. first.Select(z => Common * _law.Variance(z))];
        double[] common = [.. variances.Select(variance => Math.Sqrt(variance) * _law.Draw(random))];
        for (var i = 0; i < errors.Length; i++)
        {
            errors[i] = common[_codes[i]] + (Math.Sqrt(1 - Common) * random.Normal());
        }

        return 1 - Common + _codes.Average(code => variances[code]);
    }

    private double[] Normals(Generator random) => [.. Enumerable.Range(0, Clusters).Select(_ => random.Normal())];

    /// <summary>One number a cluster.</summary>
    private double[] Between(Generator random, int position) => _kind == ClusterColumns.ThreeClusters
        ? [.. Enumerable.Range(0, Clusters).Select(c => c is 1 or 2 or 3 ? 1.0 : 0)]
        : [.. Enumerable.Range(0, Clusters).Select(_ => ByTurns(random, position))];

    private void Fill(Generator random, double[] column, double[] between, double share)
    {
        for (var i = 0; i < column.Length; i++)
        {
            column[i] = (Math.Sqrt(share) * between[_codes[i]]) + (share < 1 ? Math.Sqrt(1 - share) * random.Normal() : 0);
        }
    }
}
