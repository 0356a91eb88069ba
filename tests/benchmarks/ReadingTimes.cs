namespace Auditor.Benchmarks;

/// <summary>Reading one file, each way in turn, all in one process after a first round that is not counted.</summary>
internal static class ReadingTimes
{
    public static void Print(string path, int runs)
    {
        (string Name, Action Work)[] ways =
        [
            ("sum of every column, DuckDB, 1 thread", () => CsvToColumns.DuckDb(path, 1)),
            ("into columns, 1 thread", () => CsvToColumns.Table(path, 1)),
            ("into columns, 2 threads", () => CsvToColumns.Table(path, 2)),
            ("SHA-256 of the file", () => CsvToColumns.Hash(path)),
        ];
        Console.Out.WriteLine($"sums agree to {Math.Abs(CsvToColumns.Tool(path, 1) - CsvToColumns.DuckDb(path, 1)):0.0e0}");
        var taken = ways.Select(_ => new List<Measured>()).ToArray();
        for (var run = 0; run <= runs; run++)
        {
            for (var way = 0; way < ways.Length; way++)
            {
                var measured = Measured.Of(ways[way].Work);
                if (run > 0)
                {
                    taken[way].Add(measured);
                }
            }
        }

        var first = Measured.Median(taken[0]);
        foreach (var (way, times) in ways.Zip(taken))
        {
            var median = Measured.Median(times);
            Console.Out.WriteLine($"{way.Name}: {median}; ratios {median.Processor / first.Processor:0.00}, {median.Wall / first.Wall:0.00}");
        }
    }
}
