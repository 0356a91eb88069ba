using Auditor.Numerics.Random;

namespace Auditor.Simulation.Bases;

/// <summary>Runs every setting of every world. Draw k of a setting has a stream of its own, and only counts are added up: threads change nothing.</summary>
internal sealed class BasisStudy(ulong seed, int draws, int threads, IProgress<double> progress)
{
    private const int Batch = 50;
    private const ulong FirstKey = 10_000;

    public IReadOnlyList<IReadOnlyList<IReadOnlyList<Counted>>> Run(IReadOnlyList<World> worlds)
    {
        var counts = worlds.Select(world => world.Settings.Select(_ => NewCounts(world)).ToArray()).ToArray();
        var batches = (
            from w in Enumerable.Range(0, worlds.Count)
            from s in Enumerable.Range(0, worlds[w].Settings.Count)
            from first in Enumerable.Range(0, (draws + Batch - 1) / Batch)
            select (w, s, first: first * Batch)).ToList();
        var done = 0;
        Parallel.ForEach(batches, new ParallelOptions { MaxDegreeOfParallelism = threads }, batch =>
        {
            var found = Run(worlds[batch.w], batch.s, FirstKey + ((ulong)batch.w * 1000) + (ulong)batch.s, batch.first);
            lock (counts)
            {
                for (var m = 0; m < found.Length; m++)
                {
                    counts[batch.w][batch.s][m].Add(found[m]);
                }

                progress.Report(++done / (double)batches.Count);
            }
        });
        return counts;
    }

    private static Counted[] NewCounts(World world) => [.. world.Measures.Select(_ => new Counted())];

    private Counted[] Run(World world, int which, ulong key, int first)
    {
        var (setting, counts) = (world.Settings[which], NewCounts(world));
        var sample = new BasisSample(setting);
        for (var draw = first; draw < Math.Min(first + Batch, draws); draw++)
        {
            sample.Draw(new Generator(seed, key, (ulong)draw));
            foreach (var effect in world.Measures.Select(measure => measure.Effect).Distinct())
            {
                sample.SetEffect(effect);
                Count(world, effect, new DataLook(sample.Design, setting.Structure), counts);
            }
        }

        return counts;
    }

    private static void Count(World world, double effect, DataLook look, Counted[] counts)
    {
        for (var m = 0; m < counts.Length; m++)
        {
            if (world.Measures[m].Effect == effect)
            {
                counts[m].Add(world.Measures[m].Happens(look));
            }
        }
    }
}
