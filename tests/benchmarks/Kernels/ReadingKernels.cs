using BenchmarkDotNet.Attributes;

namespace Auditor.Benchmarks.Kernels;

/// <summary>CSV to columns, 100,000 rows of 30 numbers.</summary>
[MemoryDiagnoser]
public class ReadingKernels
{
    private string _folder = "";
    private string _file = "";

    [Params(1, 2)]
    public int Threads { get; set; }

    [GlobalSetup]
    public void Write()
    {
        _folder = Directory.CreateTempSubdirectory("audit-benchmark-").FullName;
        _file = new DataSet(100_000, 30, 9, 20, 0, 1).Write(_folder, "numbers", gzip: false);
    }

    [GlobalCleanup]
    public void Delete() => Directory.Delete(_folder, recursive: true);

    [Benchmark(Baseline = true)]
    public double SumsByDuckDb() => CsvToColumns.DuckDb(_file, Threads);

    [Benchmark]
    public int IntoColumns() => CsvToColumns.Table(_file, Threads).RowCount;
}
