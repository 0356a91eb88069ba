namespace Auditor.Cli;

/// <summary>Lists rules and facts, or explains one rule.</summary>
internal static class RulesCommand
{
    public static int Run(string? id)
    {
        _ = id;
        Console.Error.WriteLine("error: rules: not built yet");
        return ExitStatus.Unusable;
    }
}
