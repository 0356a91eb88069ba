namespace Auditor.Cli;

/// <summary>What the exit status tells a script.</summary>
internal static class ExitStatus
{
    /// <summary>Audited, nothing at or above --fail-on.</summary>
    public const int Audited = 0;

    /// <summary>Audited, something at or above --fail-on.</summary>
    public const int Found = 1;

    /// <summary>The command line, declaration, policy, rules or data cannot be used; nothing was written.</summary>
    public const int Unusable = 2;

    /// <summary>A fault of the tool itself.</summary>
    public const int Fault = 3;
}
