using System.Diagnostics;

namespace Auditor.Cli.Tests;

/// <summary>One run of the built program in a process of its own.</summary>
internal sealed record ProgramRun(int Status, string Output, string Errors)
{
    private const int MostMilliseconds = 120_000;

    /// <summary>2026-01-01, so that two runs can be compared.</summary>
    private const string Moment = "1767225600";

    public static string Folder => AppContext.BaseDirectory;

    /// <summary>The program beside the tests, or the one that AUDITOR_PROGRAM names: what run-audit.sh built.</summary>
    public static string Built { get; } = Environment.GetEnvironmentVariable("AUDITOR_PROGRAM") ?? Path.Combine(Folder, "Auditor.Cli.dll");

    public static ProgramRun In(TemporaryFolder folder, params string[] arguments) => Of(Built, folder.Root, Moment, arguments);

    /// <param name="moment">SOURCE_DATE_EPOCH; null leaves it unset.</param>
    public static ProgramRun Of(string program, string folder, string? moment, params string[] arguments) => Of(program, folder, moment, [], arguments);

    /// <summary>A run with further environment variables.</summary>
    public static ProgramRun With(TemporaryFolder folder, (string Name, string Value)[] variables, params string[] arguments) =>
        Of(Built, folder.Root, Moment, variables, arguments);

    private static ProgramRun Of(string program, string folder, string? moment, (string Name, string Value)[] variables, string[] arguments)
    {
        var start = program.EndsWith(".dll", StringComparison.Ordinal)
            ? new ProcessStartInfo(Environment.GetEnvironmentVariable("DOTNET_HOST_PATH") ?? "dotnet", [program, .. arguments])
            : new ProcessStartInfo(program, arguments);
        start.WorkingDirectory = folder;
        start.RedirectStandardOutput = true;
        start.RedirectStandardError = true;
        start.Environment.Remove("SOURCE_DATE_EPOCH");
        start.Environment.Remove("AUDITOR_CALLED_AS");
        if (moment is not null)
        {
            start.Environment["SOURCE_DATE_EPOCH"] = moment;
        }

        foreach (var (name, value) in variables)
        {
            start.Environment[name] = value;
        }

        using var process = Process.Start(start)!;
        var output = process.StandardOutput.ReadToEndAsync();
        var errors = process.StandardError.ReadToEndAsync();
        if (!process.WaitForExit(MostMilliseconds))
        {
            process.Kill(entireProcessTree: true);
        }

        process.WaitForExit();
        return new ProgramRun(process.ExitCode, output.GetAwaiter().GetResult(), errors.GetAwaiter().GetResult());
    }

    /// <summary>Asserts the exit status, showing what the program said when it is another.</summary>
    public ProgramRun Ends(int status)
    {
        Assert.True(Status == status, $"exit status {Status}, expected {status}\n{Output}{Errors}");
        return this;
    }
}
