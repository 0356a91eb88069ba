namespace Auditor.Cli;

/// <summary>The columns of data larger than memory could not be kept beside the output.</summary>
internal sealed class SpillFault(string folder, Exception cause) : Exception(cause.Message, cause)
{
    public Problem Problem => new(folder, null, "the columns of the data take more memory than they may (--memory), and cannot be kept here while the audit runs: " + Message);

    /// <summary>The fault within what was thrown, which several threads may have wrapped; null when it is something else.</summary>
    public static SpillFault? In(Exception thrown) => thrown switch
    {
        SpillFault fault => fault,
        AggregateException { InnerExceptions: [var first, ..] } => In(first),
        { InnerException: { } inner } => In(inner),
        _ => null,
    };
}
