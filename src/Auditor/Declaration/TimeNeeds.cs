namespace Auditor.Declaration;

/// <summary>Terms in time order need an order.</summary>
internal static class TimeNeeds
{
    public static void Check(DataDeclaration? data, IEnumerable<Term> terms, ProblemList problems)
    {
        if (data is null or { Structure.TimeLine: not null })
        {
            return;
        }

        foreach (var term in terms.OfType<TimeOrderTerm>())
        {
            problems.Add(term.Line, $"{TermWords.Name(term.Operation)} needs data.time, the order of the rows");
        }
    }
}
