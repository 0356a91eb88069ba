namespace Auditor.Cli;

/// <summary>Says on standard error why the input cannot be used.</summary>
internal static class Complaint
{
    public static int Unusable(IReadOnlyList<Problem> problems)
    {
        foreach (var problem in problems)
        {
            Console.Error.WriteLine(Terminal.Safe(problem.ToString()));
        }

        return ExitStatus.Unusable;
    }
}
