namespace Auditor.Declaration;

/// <summary>
/// What a declaration may say and the program cannot compute yet: refused, because an option that is accepted and ignored is worse than none.
/// Each line of the table goes when its subject is built.
/// </summary>
public static class NotBuiltYet
{
    private sealed record Entry(string Subject, Func<ModelDeclaration, IEnumerable<int?>> Lines);

    private static readonly IReadOnlyList<Entry> _entries =
    [
        new("data.segments", declaration => [declaration.Data.Structure.Segments is [var first, ..] ? first.Line : null]),
    ];

    /// <summary>One problem for each subject and line, by line.</summary>
    public static IReadOnlyList<Problem> In(ModelDeclaration declaration)
    {
        var found = from entry in _entries
                    from line in entry.Lines(declaration).Distinct()
                    where line is not null
                    orderby line
                    select new Problem(declaration.File, line, "not built yet: " + entry.Subject);
        return [.. found];
    }
}
