namespace Auditor.Facts;

/// <summary>Every fact there is, in the order of the families.</summary>
public static class FactCatalogue
{
    public static readonly IReadOnlyList<FactDefinition> All =
    [
        .. ExclusionFacts.Definitions,
        .. AllLeftOutFacts.Definitions,
        .. FitFacts.Definitions,
        .. CheckFacts.Definitions,
        .. RowFacts.Definitions,
        .. ColumnFacts.Definitions,
        .. CoefficientFacts.Definitions,
        .. AcceptanceFacts.Definitions,
        .. ClaimFacts.Definitions,
        .. StepFacts.Definitions,
        .. SegmentFacts.Definitions,
    ];

    private static readonly ILookup<About, FactDefinition> ByAbout = All.ToLookup(fact => fact.About);

    /// <summary>The facts of one kind of subject; none for a kind that has no facts yet.</summary>
    public static IReadOnlyList<FactDefinition> Of(About about) => [.. ByAbout[about]];

    public static FactDefinition? Find(About about, string name) => ByAbout[about].FirstOrDefault(fact => fact.Name == name);
}
