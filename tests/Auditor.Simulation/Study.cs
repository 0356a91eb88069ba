using Auditor.Analysis;
using Auditor.Numerics;
using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Simulation;

/// <summary>Runs the tool's own passes, tests and verdict on simulated data. Draw k of a cell has a stream of its own: threads change nothing.</summary>
internal sealed class Study(Policies policies, ulong seed, int draws, IProgress<double> progress)
{
    private const int Batch = 50;

    /// <summary>For each cell one tally an effect, in the order of <see cref="Cell.Effects"/>.</summary>
    public IReadOnlyDictionary<Cell, IReadOnlyList<Tally>> Run()
    {
        var results = Cell.All.ToDictionary(cell => cell, _ => NewTallies());
        var batches = (from cell in Cell.All orderby cell.N descending from first in Batches() select (cell, first)).ToList();
        var done = 0;
        Parallel.ForEach(batches, new ParallelOptions { MaxDegreeOfParallelism = Environment.ProcessorCount }, batch =>
        {
            var tallies = Run(batch.cell, batch.first);
            lock (results)
            {
                for (var e = 0; e < tallies.Count; e++)
                {
                    results[batch.cell][e].Add(tallies[e]);
                }

                progress.Report(++done / (double)batches.Count);
            }
        });
        return results.ToDictionary(pair => pair.Key, pair => (IReadOnlyList<Tally>)pair.Value);
    }

    private static List<Tally> NewTallies() => [.. Cell.Effects.Select(_ => new Tally())];

    private IEnumerable<int> Batches() => Enumerable.Range(0, (draws + Batch - 1) / Batch).Select(batch => batch * Batch);

    private List<Tally> Run(Cell cell, int first)
    {
        var (sample, tallies) = (new Sample(cell), NewTallies());
        for (var draw = first; draw < Math.Min(first + Batch, draws); draw++)
        {
            sample.Draw(new Generator(seed, (ulong)cell.Index, (ulong)draw));
            for (var e = 0; e < tallies.Count; e++)
            {
                tallies[e].Add(Events(Fit(sample.WithEffect(Cell.Effects[e])), Cell.Effects[e]));
            }
        }

        return tallies;
    }

    private static GroupFit Fit(IDesignRows design)
    {
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        var group = AddedGroup.Of(final, [.. design.Layout.Groups[0].Indices]);
        return new GroupFit("group", group, RowPass.Run(design, final, [group], []).Groups[0], null, null, new Dependence(null, null, 1));
    }

    private IEnumerable<Event> Events(GroupFit fit, double effect)
    {
        var robust = Evidence(fit, policies.Hc3);
        TestResult[] tests = [robust.Tests.Classical, .. robust.Tests.Hc, robust.Tests.Score];
        for (var t = 0; t < tests.Length; t++)
        {
            if (tests[t].P <= policies.Hc3.Significance)
            {
                yield return (Event)t;
            }
        }

        if (IsSupported(robust, policies.Hc3))
        {
            yield return Event.SupportedOnHc3;
        }

        if (IsSupported(Evidence(fit, policies.Classical), policies.Classical))
        {
            yield return Event.SupportedOnClassical;
        }

        if (Covers(robust.BasisInterval, effect))
        {
            yield return Event.Hc3IntervalCovers;
        }

        if (Covers(robust.ClassicalInterval, effect))
        {
            yield return Event.ClassicalIntervalCovers;
        }
    }

    private static GroupEvidence Evidence(GroupFit fit, Policy policy) => new(new GroupResults(fit, policy.BasisWithoutStructure, sampling: false), policy);

    private static bool IsSupported(GroupEvidence evidence, Policy policy) =>
        Judgement.OfFamily([new JudgedGroup(evidence, null)], policy)[0].Verdict == Verdicts.Supported;

    private static bool Covers(EffectInterval? interval, double effect) =>
        interval is { } limits && limits.Lower <= effect && effect <= limits.Upper;
}

/// <summary>The shipped policy, with each of the two tests a verdict may rest on.</summary>
internal sealed record Policies(Policy Hc3, Policy Classical)
{
    public static Policies Read()
    {
        var shipped = File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "policy.yaml"));
        return new Policies(With(shipped, "hc3"), With(shipped, "classical"));
    }

    private static Policy With(string shipped, string basis)
    {
        var reading = PolicyReader.Read(shipped, "policy.yaml", "basis_without_structure: " + basis, "simulation");
        return reading.Value ?? throw new InvalidOperationException(string.Join('\n', reading.Problems));
    }
}
