namespace Auditor.Declaration;

/// <summary>Terms and all they are made of.</summary>
internal static class TermWalk
{
    public static IEnumerable<Term> All(Term? response, FinalModelDeclaration? final, IReadOnlyList<LeftOutGroup> groups) =>
        new[] { response }.OfType<Term>()
            .Concat(final?.Terms ?? [])
            .Concat(groups.SelectMany(group => group.Terms))
            .SelectMany(WithParts);

    private static IEnumerable<Term> WithParts(Term term) => term.Parts.SelectMany(WithParts).Prepend(term);
}
