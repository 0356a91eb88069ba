namespace Auditor.Cli;

/// <summary>The command line: the only place that knows the terminal, the clock and the file system.</summary>
internal static class Program
{
    public static int Main(string[] args)
    {
        using var log = Logging.Start(args);
        try
        {
            return CommandLine.Run(args);
        }
        catch (Exception fault)
        {
            // Everything expected is a value; what arrives here is a fault of the tool.
            Serilog.Log.Fatal(fault, "A fault of the tool itself. Nothing was written.");
            return ExitStatus.Fault;
        }
    }
}
