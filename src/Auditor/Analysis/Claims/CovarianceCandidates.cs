using Auditor.Numerics;
using Auditor.Numerics.GroupTests;

namespace Auditor.Analysis.Claims;

/// <summary>Standard errors of the final model's coefficients under one covariance, on one row set.</summary>
/// <param name="Name">As the record names it.</param>
/// <param name="Errors">By coefficient label.</param>
/// <param name="Df">Of the t distribution that goes with it.</param>
internal sealed record CovarianceCandidate(
    string Name, bool OtherRows, IReadOnlyDictionary<string, double> Errors, IReadOnlyDictionary<string, double> Estimates, double Df, double Digits)
{
    public const string Classical = "classical";

    /// <summary>Null for the classical one: nothing need be said of it.</summary>
    public string? By => Name == Classical ? null : Name;

    public Reproduction? Error(string label) =>
        Errors.TryGetValue(label, out var error) ? Reproduction.Of(error, By, OtherRows, Digits).FirstOrDefault() : null;

    /// <summary>Two-sided p of a coefficient: t on the residual degrees of freedom, then the normal that large-sample programs use.</summary>
    public IEnumerable<Reproduction> P(string label) => Errors.TryGetValue(label, out var error) && error > 0
        ? [new(Probability(label, error, Df), By, OtherRows, Digits), new(Probability(label, error, double.PositiveInfinity), Name + " with the normal distribution", OtherRows, Digits)]
        : [];

    private double Probability(string label, double error, double df) => CoefficientTest.Of(Estimates[label], error, df).P;
}

/// <summary>The covariances that authors print, in order of preference. One more is one more line.</summary>
internal static class CovarianceCandidates
{
    public static IReadOnlyList<CovarianceCandidate> Of(ClaimedRows rows)
    {
        var fit = rows.Fit.Fit;
        (string Name, IReadOnlyList<double>? Errors, double Df)[] tried =
        [
            (CovarianceCandidate.Classical, rows.Sampling ? null : fit.StandardErrors, fit.ResidualDf),
            ("hc0", Robust(rows, Heteroskedastic.Hc0), fit.ResidualDf),
            ("hc1", Robust(rows, Heteroskedastic.Hc1), fit.ResidualDf),
            ("hc2", Robust(rows, Heteroskedastic.Hc2), fit.ResidualDf),
            ("hc3", Robust(rows, Heteroskedastic.Hc3), fit.ResidualDf),
            ("cr1", Usable(rows) && rows.Fit.ClusterScores is { } clusters ? CoefficientCovariance.ClusteredErrors(clusters) : null, (rows.Fit.ClusterScores?.Count ?? 2) - 1),
            ("newey_west", Serial(rows, adjusted: true), fit.ResidualDf),
            ("newey_west_unadjusted", Serial(rows, adjusted: false), fit.ResidualDf),
        ];
        var estimates = ByLabel(rows, fit.Coefficients);
        return [.. from one in tried where one.Errors is not null select new CovarianceCandidate(one.Name, rows.Other, ByLabel(rows, one.Errors!), estimates, one.Df, rows.Digits)];
    }

    private static IReadOnlyList<double>? Robust(ClaimedRows rows, Heteroskedastic estimator) =>
        Usable(rows) && rows.Fit.Scores is { } scores ? CoefficientCovariance.StandardErrors(scores, estimator) : null;

    private static IReadOnlyList<double>? Serial(ClaimedRows rows, bool adjusted) => Usable(rows) && rows.Fit is { PeriodScores: { } periods, SerialLag: int lag }
        ? CoefficientCovariance.SerialErrors(periods, lag, adjusted)
        : null;

    private static bool Usable(ClaimedRows rows) => !rows.Fit.Fit.Perfect && rows.Fit.Fit.ResidualDf > 0;

    private static Dictionary<string, double> ByLabel(ClaimedRows rows, IReadOnlyList<double> values) =>
        rows.Fit.Fit.Columns.Select((column, k) => (rows.Fit.Plan.Labels[column], values[k])).ToDictionary(StringComparer.Ordinal);
}
