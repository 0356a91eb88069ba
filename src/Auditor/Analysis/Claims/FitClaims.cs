using Auditor.Declaration;
using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>The figures of the final model against its refit on one row set.</summary>
internal sealed class FitClaims(ClaimedFit claimed, ClaimedRows rows, ClaimJudgement judgement)
{
    private const string NoDigit = "rounding leaves no digit of the coefficients";

    private readonly CovarianceSearch _search = new(CovarianceCandidates.Of(rows), claimed.Coefficients);

    public StandardErrorsReproduced? StandardErrors => _search.Statement;

    public IReadOnlyList<ClaimResult> All =>
    [
        .. Whole(claimed.Rows, one => Figure(one, one.Summary.Rows)),
        .. Whole(claimed.RSquared, one => Figure(one, one.Summary.RSquared)),
        .. Whole(claimed.AdjustedRSquared, one => Figure(one, one.Summary.AdjustedRSquared)),
        .. Whole(claimed.ResidualSd, Spreads),
        .. Whole(claimed.F, Fs),
        .. claimed.Coefficients.SelectMany(Coefficient),
    ];

    private IEnumerable<ClaimResult> Whole(ClaimedFigure? claim, Func<ClaimedRows, IEnumerable<Reproduction>> values) =>
        claim is null ? [] : [judgement.Of(claim, [.. values(rows)], rows.Summary.Why)];

    private static IEnumerable<Reproduction> Figure(ClaimedRows rows, double? value, string? by = null) =>
        Reproduction.Of(value, by, rows.Other, ClaimedRows.FitDigits);

    /// <summary>sqrt(RSS / (n - r)), and sqrt(RSS / n), which some programs print under the same name.</summary>
    private static IEnumerable<Reproduction> Spreads(ClaimedRows rows) =>
        [.. Figure(rows, rows.Summary.Sigma), .. Figure(rows, Math.Sqrt(rows.Summary.Rss / rows.Summary.Rows), "root of rss over n")];

    private static IEnumerable<Reproduction> Fs(ClaimedRows rows) =>
    [
        .. Figure(rows, rows.Summary.F),
        .. rows.Fit.Scores is null || rows.Fit.Fit.Perfect
            ? []
            : Enum.GetValues<Heteroskedastic>().SelectMany(form => Figure(
                rows, (CoefficientCovariance.OverallF(rows.Fit.Scores, form) as FTest)?.Statistic, form.ToString().ToLowerInvariant())),
    ];

    private IEnumerable<ClaimResult> Coefficient(ClaimedCoefficient claim)
    {
        var known = rows.Coefficient(claim.Label);
        var trusted = rows.Digits >= 1;
        var why = known is not null
            ? trusted ? known.Why : NoDigit
            : "the final model has no coefficient of that label" + CoefficientLabels.DidYouMean(claim.Label, rows.Summary.Coefficients.Select(one => one.Name));
        var covariances = trusted ? _search.Ordered : [];
        return
        [
            .. One(claim.Estimate, Reproduction.Of(trusted ? known?.Estimate : null, null, rows.Other, rows.Digits), why),
            .. One(claim.StandardError, covariances.Select(one => one.Error(claim.Label)).OfType<Reproduction>(), why),
            .. One(claim.P, covariances.SelectMany(one => one.P(claim.Label)), why),
        ];
    }

    private IEnumerable<ClaimResult> One(ClaimedFigure? claim, IEnumerable<Reproduction> values, string? why) =>
        claim is null ? [] : [judgement.Of(claim, [.. values], why)];
}
