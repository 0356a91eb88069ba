using System.Diagnostics;
using System.Globalization;

namespace Auditor.Benchmarks;

/// <summary>Processor and wall seconds of one run, and the most memory its process ever held.</summary>
internal readonly record struct Measured(double Processor, double Wall, double PeakMegabytes)
{
    /// <summary>Runs a command to its end; standard output is dropped.</summary>
    public static Measured Of(string command, params IEnumerable<string> arguments)
    {
        using var process = Process.Start(new ProcessStartInfo(command, arguments) { RedirectStandardOutput = true, RedirectStandardError = true })!;
        var clock = Stopwatch.StartNew();
        var errors = process.StandardError.ReadToEndAsync();
        process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        var wall = clock.Elapsed.TotalSeconds;
        return process.ExitCode < 2
            ? new Measured(process.TotalProcessorTime.TotalSeconds, wall, double.NaN)
            : throw new InvalidOperationException($"{command} ended with {process.ExitCode}: {errors.Result}");
    }

    /// <summary>Runs a piece of work in this process.</summary>
    public static Measured Of(Action work)
    {
        GC.Collect();
        using var process = Process.GetCurrentProcess();
        var (processor, clock) = (process.TotalProcessorTime, Stopwatch.StartNew());
        work();
        var wall = clock.Elapsed.TotalSeconds;
        process.Refresh();
        return new Measured((process.TotalProcessorTime - processor).TotalSeconds, wall, process.PeakWorkingSet64 / 1e6);
    }

    /// <summary>Medians of several runs, each taken by itself.</summary>
    public static Measured Median(IReadOnlyList<Measured> runs) =>
        new(Middle(runs.Select(run => run.Processor)), Middle(runs.Select(run => run.Wall)), runs.Max(run => run.PeakMegabytes));

    public override string ToString() =>
        string.Create(CultureInfo.InvariantCulture, $"processor {Processor:0.000} s, wall {Wall:0.000} s");

    private static double Middle(IEnumerable<double> values) => values.Order().ElementAt(values.Count() / 2);
}
