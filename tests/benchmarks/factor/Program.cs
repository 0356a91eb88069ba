using System.Diagnostics;
using System.Globalization;
using Auditor.Benchmarks.Factor;
using Auditor.Numerics.Factor;

// Factorising [X y] against the processor's dgemm peak and LAPACK's dgeqrf in one run; every figure the median of five.
// dotnet run -c Release -- [path of an OpenBLAS shared library]
var blas = args.Length > 0 ? OpenBlas.Load(args[0]) : null;
var peak = blas is null ? double.NaN : DgemmPeak(blas);
Say($"processors {Environment.ProcessorCount}, .NET {Environment.Version}, {blas?.Version ?? "no OpenBLAS"}");
Say($"dgemm peak, one thread: {peak / 1e9:F1} Gflop/s");
foreach (var (rows, columns) in new[] { (1_000_000, 40), (200_000, 200) })
{
    Compare(rows, columns);
}

void Compare(int rows, int columns)
{
    var design = new StoredRows(rows, columns);
    var flops = 2.0 * rows * (columns + 1) * (columns + 1);
    var one = Median(() => FactorBuilder.Build(design));
    var two = Median(() => FactorBuilder.Build(design, threads: 2));
    Say($"n = {rows}, p = {columns}: {one * 1000:F0} ms, {flops / one / 1e9:F1} Gflop/s, {100 * flops / one / peak:F0} % of dgemm peak; two threads {one / two:F2} x");
    if (blas is not null)
    {
        var all = design.ColumnMajor(rows);
        var lapack = Median(() => blas.Factor(rows, columns + 1, all));
        Say($"    dgeqrf {lapack * 1000:F0} ms, {lapack / one:F1} x");
    }
}

double DgemmPeak(OpenBlas library)
{
    const int Size = 2048;
    var (a, b, c) = (new double[Size * Size], new double[Size * Size], new double[Size * Size]);
    Array.Fill(a, 0.5);
    Array.Fill(b, 0.25);
    return 2.0 * Size * Size * Size / Median(() => library.Multiply(Size, a, b, c));
}

static double Median(Action work)
{
    work();
    work();
    var seconds = new double[5];
    for (var at = 0; at < seconds.Length; at++)
    {
        var watch = Stopwatch.StartNew();
        work();
        seconds[at] = watch.Elapsed.TotalSeconds;
    }

    Array.Sort(seconds);
    return seconds[2];
}

static void Say(FormattableString line) => Console.WriteLine(line.ToString(CultureInfo.InvariantCulture));
