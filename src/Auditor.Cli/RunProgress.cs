using System.Diagnostics;
using System.Globalization;
using Auditor.Data;
using Serilog;

namespace Auditor.Cli;

/// <summary>
/// Says how far a run has come: on a terminal by one line that is rewritten, with --verbose by lines in the log (each step with its seconds), else not at
/// all. Standard output is never written to.
/// </summary>
internal sealed class RunProgress(AuditRequest request) : IProgress<ReadingProgress>, IProgress<AuditStep>
{
    private readonly Stopwatch _clock = Stopwatch.StartNew();
    private readonly TimeSpan _pause = TimeSpan.FromSeconds(request.Verbose ? 5 : 0.2);
    private Action<string>? _line;
    private string? _step;
    private TimeSpan _began;
    private TimeSpan _said;

    /// <summary>A live line and log lines would tear each other apart, so there is one or the other.</summary>
    private bool OnTerminal => request is { Quiet: false, NoProgress: false, Verbose: false } && !Console.IsErrorRedirected;

    /// <summary>Does the work, with the line on the terminal while it lasts.</summary>
    public T Around<T>(Func<T> work)
    {
        try
        {
            return OnTerminal ? TerminalLine.While(line =>
            {
                _line = line;
                return work();
            }) : work();
        }
        finally
        {
            End();
        }
    }

    public void Begin(string step)
    {
        End();
        (_step, _began) = (step, _clock.Elapsed);
        _line?.Invoke(step);
    }

    void IProgress<AuditStep>.Report(AuditStep value) => Begin(Words(value));

    void IProgress<ReadingProgress>.Report(ReadingProgress value)
    {
        var now = _clock.Elapsed;
        if (request.NoProgress || now - _said < _pause || now - _began < _pause)
        {
            return;
        }

        _said = now;
        var words = Words(value, (now - _began).TotalSeconds);
        _line?.Invoke(words);
        Log.Debug("{Progress:l}", words);
    }

    /// <param name="seconds">Since the reading began.</param>
    public static string Words(ReadingProgress progress, double seconds)
    {
        var speed = string.Create(CultureInfo.InvariantCulture, $"{progress.Rows:N0} rows read, {progress.Rows / seconds:N0} a second");
        return progress is { AllBytes: long all and > 0, Bytes: > 0 }
            ? string.Create(CultureInfo.InvariantCulture, $"{speed}, {(double)progress.Bytes / all:P0}, about {seconds * (all - progress.Bytes) / progress.Bytes:N0} s left")
            : speed;
    }

    private void End()
    {
        if (_step is not null)
        {
            Log.Debug("{Seconds,7:0.000} s  {Step:l}", (_clock.Elapsed - _began).TotalSeconds, _step);
        }

        _step = null;
    }

    private static string Words(AuditStep step) => step switch
    {
        AuditStep.Terms => "Terms bound to the data",
        AuditStep.RowSets => "Rows chosen",
        AuditStep.Fits => "Models fitted",
        AuditStep.Influence => "Influence of rows",
        AuditStep.Checks => "Residual checks",
        AuditStep.Pictures => "Points of the pictures",
        AuditStep.Groups => "Tests of the groups",
        _ => "Rules",
    };
}
