namespace Auditor.Analysis.Claims;

/// <summary>A number that a figure of the report may be: recomputed in one form on one row set.</summary>
/// <param name="By">The form, null for the classical one.</param>
/// <param name="OtherRows">Computed on the other row set, not on the one that is shown.</param>
/// <param name="Digits">Decimal digits to which it can be trusted.</param>
internal sealed record Reproduction(double Value, string? By, bool OtherRows, double Digits)
{
    /// <summary>None when the value is missing.</summary>
    public static IEnumerable<Reproduction> Of(double? value, string? by, bool otherRows, double digits) =>
        value is double number && double.IsFinite(number) ? [new Reproduction(number, by, otherRows, digits)] : [];
}
