namespace Auditor.Numerics.Elimination;

/// <summary>What an elimination starts from: the largest model, split into columns that always stay and units that go as a whole.</summary>
/// <param name="Forced">Design columns that no rule can drop: the intercept and forced terms.</param>
/// <param name="Units">Units in declared order: their order decides ties.</param>
/// <param name="Observations">n: rows, or the sum of copies.</param>
public sealed record Candidates(IReadOnlyList<int> Forced, IReadOnlyList<CandidateUnit> Units, double Observations)
{
    /// <summary>The largest model.</summary>
    public UnitSet All => UnitSet.All(Units.Count);

    /// <summary>The model that was reported.</summary>
    public UnitSet Reported => UnitSet.Of(Enumerable.Range(0, Units.Count).Where(unit => !Units[unit].LeftOut));
}

/// <param name="Columns">Design columns, at least one.</param>
/// <param name="LeftOut">The reported model does not hold it.</param>
public sealed record CandidateUnit(IReadOnlyList<int> Columns, bool LeftOut);
