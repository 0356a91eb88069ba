using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>Rows with clusters and periods, from the project's own random numbers: two columns in the final model, two left out.</summary>
internal sealed class DependentRows
{
    public DependentRows(int rows, int clusters, int periods, ulong seed = 1)
    {
        var random = new Generator(seed);
        double[] Normal(int n) => [.. Enumerable.Range(0, n).Select(_ => random.Normal())];
        Cluster = [.. Enumerable.Range(0, rows).Select(i => i < clusters ? i : (int)(clusters * Math.Pow(random.Uniform(), 1.5)))];
        Period = [.. Enumerable.Range(0, rows).Select(i => i < periods ? i : (int)(periods * random.Uniform()))];
        var (inCluster, inPeriod) = (Normal(clusters), Normal(periods));
        Final = [Normal(rows), Normal(rows)];
        Group = [[.. Normal(rows).Zip(Cluster, (value, c) => value + inCluster[c])], [.. Normal(rows).Zip(Period, (value, t) => value + inPeriod[t])]];
        var noise = Normal(rows);
        Response = [.. Enumerable.Range(0, rows).Select(i => 1 + Final[0][i] + (0.2 * Group[0][i]) + inCluster[Cluster[i]] + (0.5 * inPeriod[Period[i]]) + noise[i])];
        Weights = [.. Enumerable.Range(0, rows).Select(_ => Math.Round(0.3 + random.Uniform(), 2))];
        Copies = [.. Enumerable.Range(0, rows).Select(_ => 1 + Math.Floor(3 * random.Uniform()))];
    }

    public int[] Cluster { get; }

    public int[] Period { get; }

    public double[][] Final { get; }

    public double[][] Group { get; }

    public double[] Response { get; }

    public double[] Weights { get; }

    public double[] Copies { get; }

    public DependenceStructure Structure => new()
    {
        Cluster = new RowClasses(Cluster, Cluster.Max() + 1),
        Period = new RowClasses(Period, Period.Max() + 1),
    };

    public GroupAnalysis Analyse(DependenceStructure? structure = null, bool weighted = false, bool copied = false) => new(
        new MatrixDesign(true, Final, [Group], Response, weighted ? Weights : null, copied ? Copies : null), structure ?? Structure);

    /// <summary>The same rows written out as often as they have copies, times sqrt(w), for dense matrices.</summary>
    public (BruteForce Matrices, int[] Cluster, int[] Period) Expanded(bool weighted, bool copied)
    {
        int[] rows = [.. Enumerable.Range(0, Response.Length).SelectMany(i => Enumerable.Repeat(i, copied ? (int)Copies[i] : 1))];
        double[] Column(Func<int, double> value) => [.. rows.Select(i => value(i) * Math.Sqrt(weighted ? Weights[i] : 1))];
        double[][] final = [Column(_ => 1), .. Final.Select(column => Column(i => column[i]))];
        var matrices = new BruteForce(final, [.. Group.Select(column => Column(i => column[i]))], Column(i => Response[i]));
        return (matrices, [.. rows.Select(i => Cluster[i])], [.. rows.Select(i => Period[i])]);
    }
}
