using System.Text.Json.Serialization;

namespace Auditor.Results;

/// <summary>A refit of the final model on one row set.</summary>
/// <param name="TrustworthyDigits">Decimal digits of the least certain coefficient that survive rounding.</param>
public sealed record FitSummary(
    int Rows,
    int Rank,
    double DfResidual,
    double Rss,
    double? Sigma,
    double? RSquared,
    double? AdjustedRSquared,
    double? F,
    double? FDf1,
    double? FDf2,
    [property: JsonPropertyName("f_p")] double? FP,
    [property: JsonPropertyName("f_log10_p"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? FLog10P,
    double? LogLikelihood,
    double? Aic,
    double? Bic,
    double? ConditionNumber,
    double? TrustworthyDigits,
    IReadOnlyList<AliasedColumn> Aliased,
    IReadOnlyList<NearlyAliasedColumn> NearlyAliased,
    IReadOnlyList<CoefficientFigures> Coefficients,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>One coefficient with its classical test and interval at 1 - significance; an aliased one has nulls and says why.</summary>
public sealed record CoefficientFigures(
    string Name,
    double? Estimate,
    double? StandardError,
    double? T,
    double? P,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? Log10P,
    double? Lower,
    double? Upper,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);
