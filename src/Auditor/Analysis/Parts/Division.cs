using Auditor.Data;

namespace Auditor.Analysis.Parts;

/// <summary>One way in which rows are divided: by a segment column, at the declared split, in halves of the time span.</summary>
/// <param name="By">What divides them, as the record and findings name it.</param>
/// <param name="Kind">One of <see cref="Results.Divisions"/>.</param>
/// <param name="Parts">Empty when the rows are not divided; <paramref name="Why"/> then says why not.</param>
internal sealed record Division(string By, string Kind, IReadOnlyList<DivisionPart> Parts, string? Why = null);

/// <param name="Label">For readers.</param>
/// <param name="Holds">Whether a row of the table lies in the part.</param>
internal sealed record DivisionPart(string Label, Func<int, bool> Holds)
{
    public RowSubset Of(RowSubset rows) => rows.Where(Holds);
}
