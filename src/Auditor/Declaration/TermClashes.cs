using System.Globalization;
using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>A term may stand once: as the response, in the final model or in one left-out group.</summary>
internal static class TermClashes
{
    private sealed record Standing(Term Term, string Where);

    public static void Check(Term? response, FinalModelDeclaration? final, IReadOnlyList<LeftOutGroup> groups, ProblemList problems)
    {
        var first = new Dictionary<Term, Standing>();
        foreach (var standing in All(response, final, groups))
        {
            var meaning = TermMeaning.Of(standing.Term);
            if (!first.TryAdd(meaning, standing))
            {
                problems.Add(standing.Term.Line, Message(standing, first[meaning]));
            }
        }
    }

    private static IEnumerable<Standing> All(Term? response, FinalModelDeclaration? final, IReadOnlyList<LeftOutGroup> groups) =>
    [
        .. response is null ? Array.Empty<Standing>() : [new Standing(response, "response")],
        .. (final?.Terms ?? []).Select(term => new Standing(term, FinalModelReader.Where)),
        .. groups.SelectMany(group => group.Terms.Select(term => new Standing(term, LeftOutReader.Where(group.Name)))),
    ];

    private static string Message(Standing again, Standing first)
    {
        var label = Words.Short(again.Term.Label);
        var written = first.Term.Label == again.Term.Label ? "" : $" as '{Words.Short(first.Term.Label)}'";
        var line = first.Term.Line.ToString(CultureInfo.InvariantCulture);
        return first.Where switch
        {
            "response" => $"{again.Where}: the term '{label}' is the response{written} on line {line}",
            _ when first.Where == again.Where => $"{again.Where}: the term '{label}' stands twice, first{written} on line {line}",
            _ => $"{again.Where}: the term '{label}' is also in {first.Where}{written} on line {line}",
        };
    }
}
