using System.Diagnostics;
using System.Globalization;

namespace Auditor.Benchmarks;

/// <summary>Processor and wall seconds of one run, and the most memory its process ever held.</summary>
internal readonly record struct Measured(double Processor, double Wall, double PeakMegabytes)
{
    /// <summary>Runs a command to its end under GNU time, which says what it used and its peak of memory; standard output is dropped.</summary>
    public static Measured Of(string command, params IEnumerable<string> arguments)
    {
        var used = Path.GetTempFileName();
        using var process = Process.Start(new ProcessStartInfo("/usr/bin/time", ["-f", "%U %S %e %M", "-o", used, command, .. arguments])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        })!;
        var errors = process.StandardError.ReadToEndAsync();
        process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        var figures = File.ReadAllLines(used)[^1].Split(' ').Select(text => double.Parse(text, CultureInfo.InvariantCulture)).ToArray();
        File.Delete(used);
        return process.ExitCode < 2
            ? new Measured(figures[0] + figures[1], figures[2], figures[3] * 1024 / 1e6)
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
        string.Create(CultureInfo.InvariantCulture, $"processor {Processor:0.000} s, wall {Wall:0.000} s, peak {PeakMegabytes:0} MB");

    private static double Middle(IEnumerable<double> values) => values.Order().ElementAt(values.Count() / 2);
}
