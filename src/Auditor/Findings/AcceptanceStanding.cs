namespace Auditor.Findings;

/// <summary>What became of one acceptance in one audit.</summary>
/// <param name="ModelVersion">The audited model's version, when its declaration states one.</param>
/// <param name="AsOf">The day that decides.</param>
/// <param name="Found">Severity of the finding it speaks of; null when there is no such finding.</param>
/// <param name="P">What <see cref="WorstAccepted.P"/> is compared with, when the subject has it.</param>
/// <param name="PartialRSquared">What <see cref="WorstAccepted.PartialRSquared"/> is compared with, when the subject has it.</param>
/// <param name="Reasons">Why it does not hold, in words; none when it holds.</param>
/// <param name="Hint">The subject that was probably meant when there is no such finding, as a part of a sentence; else empty.</param>
public sealed record AcceptanceStanding(
    AcceptanceEntry Entry,
    string? ModelVersion,
    DateOnly AsOf,
    Severity? Found,
    double? P,
    double? PartialRSquared,
    IReadOnlyList<string> Reasons,
    string Hint)
{
    /// <summary>The model that the entry names, when it is not the audited one but nearly; null otherwise.</summary>
    public string? NearModel { get; init; }

    public bool Matched => Found is not null;

    public bool Holds => Matched && Reasons.Count == 0;

    public int DaysLeft => Entry.Expires.DayNumber - AsOf.DayNumber;
}
