using Auditor.Findings;

namespace Auditor.Acceptances;

/// <summary>The acceptances that an audit is given, and the day on which they must hold.</summary>
/// <param name="Entries">All of the file, those of other models too.</param>
public sealed record AcceptancesOfRun(IReadOnlyList<AcceptanceEntry> Entries, DateOnly AsOf)
{
    public static AcceptancesOfRun None { get; } = new([], DateOnly.MinValue);
}
