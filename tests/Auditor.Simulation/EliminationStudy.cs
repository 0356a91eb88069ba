using Auditor.Numerics.Elimination;
using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Random;

namespace Auditor.Simulation;

/// <summary>
/// Reports made by a rule of backward elimination: the rule chooses the reported model, and the tested unit, where the rule dropped it, is tested as the audit does: plainly, and given the
/// rule. Draw k of a cell has a stream of its own, so threads change nothing.
/// </summary>
internal sealed class EliminationStudy(ulong seed, int draws, IProgress<double> progress)
{
    private const double Level = 0.05;

    public IReadOnlyList<(EliminationCell Cell, EliminationTally Tally)> Run()
    {
        var done = 0;
        return [.. EliminationCell.All.Select(cell =>
        {
            var found = new (double Plain, double Selective)?[draws];
            Parallel.For(0, draws, new ParallelOptions { MaxDegreeOfParallelism = Environment.ProcessorCount }, draw =>
                found[draw] = Report(cell, new Generator(seed, 1000 + (ulong)cell.Index, (ulong)draw)));
            progress.Report(++done / (double)EliminationCell.All.Count);
            return (cell, EliminationTally.Of([.. found.OfType<(double, double)>()], Level));
        })];
    }

    /// <summary>Both p of the tested unit; null when the rule keeps it, or drops a unit that is needed (the null would then be false for another reason).</summary>
    private static (double Plain, double Selective)? Report(EliminationCell cell, Generator random)
    {
        var data = new EliminationData(cell, random);
        var start = Candidates(data, []);
        var chosen = new EliminationPath(start.Final, start.Candidates, cell.Rule.New()).Kept;
        if (chosen.Contains(EliminationData.Tested) || !EliminationData.Needed.All(chosen.Contains))
        {
            return null;
        }

        int[] kept = [.. Enumerable.Range(0, data.Units.Count).Where(chosen.Contains)];
        int[] dropped = [.. Enumerable.Range(0, data.Units.Count).Except(kept)];
        var (final, candidates) = Candidates(data, kept);
        var group = AddedGroup.Of(final, [.. final.Factor.Layout.Groups[Array.IndexOf(dropped, EliminationData.Tested)].Indices]);
        var rule = cell.Rule.New();
        var selective = SelectiveP.Of(group, candidates, rule, new EliminationPath(final, candidates, rule));
        return selective.P is double p ? (PartialF.Of(group).P!.Value, p) : throw new InvalidOperationException(selective.ToString());
    }

    private static (FinalFactor Final, Candidates Candidates) Candidates(EliminationData data, int[] kept)
    {
        var design = data.Design(kept);
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        var columns = Enumerable.Range(1, design.Layout.FinalColumns - 1);
        return (final, new Candidates(
            [0],
            [.. Units(data, kept, columns.First).Concat(design.Layout.Groups.Select(range => new CandidateUnit([.. range.Indices], LeftOut: true)))],
            final.Factor.Totals.N));
    }

    private static IEnumerable<CandidateUnit> Units(EliminationData data, int[] kept, Func<int> first)
    {
        var at = kept.Length == 0 ? 0 : first();
        foreach (var unit in kept)
        {
            yield return new CandidateUnit([.. Enumerable.Range(at, data.Units[unit].Length)], LeftOut: false);
            at += data.Units[unit].Length;
        }
    }
}

/// <param name="Columns">Of the tested unit.</param>
/// <param name="Effect">Its first coefficient in standard errors of the largest model, about.</param>
internal sealed record EliminationCell(int Index, StudiedRule Rule, int Columns, double Effect)
{
    public static IReadOnlyList<EliminationCell> All { get; } =
    [
        .. (from rule in StudiedRule.All from columns in new[] { 1, 2 } from effect in new[] { 0, 1.5, 2, 2.5, 3, 4 } select (rule, columns, effect))
            .Select((setting, index) => new EliminationCell(index, setting.rule, setting.columns, setting.effect)),
    ];
}

internal sealed record StudiedRule(string Name, DroppingCriterion Criterion, double Bound)
{
    public static IReadOnlyList<StudiedRule> All { get; } = [new("p above 0.05", DroppingCriterion.PartialF, 0.05), new("AIC", DroppingCriterion.Aic, 0)];

    public DroppingRule New() => new(Criterion, Bound);
}

/// <summary>
/// 100 rows; two needed units of one column (coefficients of 10 standard errors and more), the tested unit, three units without effect (1, 2 and 1 columns). All columns share a
/// normal part (correlation about 1/3); errors normal with equal variance.
/// </summary>
internal sealed class EliminationData
{
    public const int Tested = 2;

    private const int Rows = 100;
    private const double Shared = 0.7;

    private readonly double[] _response = new double[Rows];

    public EliminationData(EliminationCell cell, Generator random)
    {
        var shared = Normals(random);
        Units = [.. new[] { 1, 1, cell.Columns, 1, 2, 1 }.Select(width => Enumerable.Range(0, width).Select(_ => Column(random, shared)).ToArray())];
        var columns = 7 + cell.Columns - 1;
        var unique = 1 + (Shared * Shared / (1 + (columns * Shared * Shared)));
        var slope = cell.Effect / Math.Sqrt(Rows * unique);
        for (var i = 0; i < Rows; i++)
        {
            _response[i] = random.Normal() + (1.5 * Units[0][0][i]) + (1.2 * Units[1][0][i]) + (slope * Units[Tested][0][i]);
        }
    }

    public static IReadOnlyList<int> Needed => [0, 1];

    public IReadOnlyList<double[][]> Units { get; }

    /// <summary>Intercept and the kept units as the final model, every other unit a group, in order.</summary>
    public MemoryRows Design(int[] kept)
    {
        var (final, ranges) = (1 + kept.Sum(unit => Units[unit].Length), new List<ColumnRange>());
        int[] left = [.. Enumerable.Range(0, Units.Count).Except(kept)];
        foreach (var unit in left)
        {
            ranges.Add(new ColumnRange(final + ranges.Sum(range => range.Count), Units[unit].Length));
        }

        var design = new MemoryRows(new DesignLayout(true, final, ranges), Rows);
        double[][] columns = [[.. Enumerable.Repeat(1.0, Rows)], .. kept.Concat(left).SelectMany(unit => Units[unit]), _response];
        for (var c = 0; c < columns.Length; c++)
        {
            design.Set(c, columns[c]);
        }

        return design;
    }

    private static double[] Normals(Generator random) => [.. Enumerable.Range(0, Rows).Select(_ => random.Normal())];

    private static double[] Column(Generator random, double[] shared) => [.. Normals(random).Zip(shared, (own, common) => own + (Shared * common))];
}

/// <param name="Reports">In which the rule dropped the tested unit and kept the needed ones.</param>
/// <param name="Distance">Kolmogorov and Smirnov's distance of the selective p from uniform.</param>
internal sealed record EliminationTally(int Reports, Share Plain, Share Selective, double Distance)
{
    public static EliminationTally Of((double Plain, double Selective)[] found, double level)
    {
        double[] sorted = [.. found.Select(pair => pair.Selective).Order()];
        var m = sorted.Length;
        var distance = sorted.Select((p, i) => Math.Max(p - (i / (double)m), ((i + 1) / (double)m) - p)).DefaultIfEmpty(0).Max();
        return new EliminationTally(
            m,
            new Share(found.Count(pair => pair.Plain <= level) / (double)Math.Max(m, 1), Math.Max(m, 1)),
            new Share(found.Count(pair => pair.Selective <= level) / (double)Math.Max(m, 1), Math.Max(m, 1)),
            distance);
    }

    /// <summary>Upper tail of Kolmogorov's law with Stephens' correction for the size (1970; from memory).</summary>
    public double DistanceP
    {
        get
        {
            var root = Math.Sqrt(Reports);
            var x = (root + 0.12 + (0.11 / root)) * Distance;
            return Math.Clamp(2 * Enumerable.Range(1, 50).Sum(k => (k % 2 == 1 ? 1 : -1) * Math.Exp(-2 * k * k * x * x)), 0, 1);
        }
    }
}
