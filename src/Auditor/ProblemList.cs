namespace Auditor;

/// <summary>Collects every problem of one file while it is read.</summary>
internal sealed class ProblemList(string file)
{
    private readonly List<Problem> _problems = [];

    public bool Any => _problems.Count > 0;

    /// <summary>By line; those of one line in the order they were found.</summary>
    public IReadOnlyList<Problem> InOrder => [.. _problems.OrderBy(problem => problem.Line ?? 0)];

    public void Add(int? line, string message) => _problems.Add(new Problem(file, line, message));
}
