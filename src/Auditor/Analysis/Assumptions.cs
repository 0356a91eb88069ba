namespace Auditor.Analysis;

/// <summary>What a check is about, as the record writes it.</summary>
internal static class Assumptions
{
    public const string EqualVariance = "equal_variance";
    public const string Normality = "normality";
    public const string Independence = "no_serial_correlation";
    public const string StationaryResidual = "stationary_residual";
    public const string Form = "functional_form";
    public const string NoOutlier = "no_outlier";
    public const string StableCoefficients = "stable_coefficients";
}
