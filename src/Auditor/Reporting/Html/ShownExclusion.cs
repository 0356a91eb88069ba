using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>A group as the page may show it: a test that cannot reject says nothing of the effect's size, whatever its formulas yield.</summary>
internal static class ShownExclusion
{
    public const string CannotReject = "the test cannot reject here";

    /// <summary>Without what an untestable group's test would say of the size: its interval, rows, power against the bound. The record keeps them.</summary>
    public static Exclusion Of(Exclusion exclusion) => exclusion.Verdict == Verdicts.Untestable && exclusion.PartialRSquared.Estimate is not null ? Sizeless(exclusion) : exclusion;

    private static Exclusion Sizeless(Exclusion exclusion)
    {
        string why = exclusion.PartialRSquared.Why ?? CannotReject;
        return exclusion with
        {
            PartialRSquared = exclusion.PartialRSquared with { BasisLower = null, BasisUpper = null, Why = why },
            EffectiveRows = null,
            Negligible = exclusion.Negligible with { P = null, PAdjusted = null, Why = exclusion.Negligible.Why ?? why },
            Materiality = Materialities.NotShown,
            Why = new Dictionary<string, string>(exclusion.Why) { ["effective_rows"] = exclusion.Why.GetValueOrDefault("effective_rows") ?? why },
        };
    }
}
