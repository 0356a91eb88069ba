using System.Globalization;
using Serilog;
using Serilog.Events;

namespace Auditor.Cli;

/// <summary>Logs go to standard error: warnings and worse, steps too with --verbose.</summary>
internal static class Logging
{
    public static IDisposable Start(string[] args)
    {
        var level = args.Contains("--verbose", StringComparer.Ordinal) ? LogEventLevel.Debug : LogEventLevel.Warning;
        Log.Logger = new LoggerConfiguration()
            .MinimumLevel.Is(level)
            .WriteTo.Console(
                standardErrorFromLevel: LogEventLevel.Verbose,
                formatProvider: CultureInfo.InvariantCulture,
                outputTemplate: "{Level:w} {Message:lj}{NewLine}{Exception}")
            .CreateLogger();
        return new Closing();
    }

    private sealed class Closing : IDisposable
    {
        public void Dispose() => Log.CloseAndFlush();
    }
}
