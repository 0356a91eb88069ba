using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>
/// Which covariance the author used, on one row set: the one that reproduces most of the reported standard errors (then most of the p of coefficients),
/// the classical one first on a tie. All figures of a report are judged by one covariance, since few digits agree with some covariance by chance.
/// </summary>
internal sealed class CovarianceSearch
{
    private readonly IReadOnlyList<CovarianceCandidate> _candidates;
    private readonly IReadOnlyList<ClaimedCoefficient> _claims;

    public CovarianceSearch(IReadOnlyList<CovarianceCandidate> candidates, IReadOnlyList<ClaimedCoefficient> claims)
    {
        (_candidates, _claims) = (candidates, claims);
        Best = candidates.OrderByDescending(Errors).ThenByDescending(Probabilities).FirstOrDefault();
    }

    /// <summary>Null when there is no candidate.</summary>
    public CovarianceCandidate? Best { get; }

    /// <summary>The best first, then the classical ones.</summary>
    public IEnumerable<CovarianceCandidate> Ordered => Best is null ? [] : [Best, .. _candidates.Where(one => one.By is null && one != Best)];

    public StandardErrorsReproduced? Statement
    {
        get
        {
            var reported = _claims.Count(claim => claim.StandardError is not null);
            if (reported == 0)
            {
                return null;
            }

            var most = Best is null ? 0 : Errors(Best);
            return most == 0
                ? new StandardErrorsReproduced(null, 0, reported, [], null, Best is null ? "no covariance could be computed" : "none of " + string.Join(", ", _candidates.Select(one => one.Name)) + " reproduces one")
                : new StandardErrorsReproduced(Best!.Name, most, reported, Also(most), Best.OtherRows ? ClaimResult.OtherRows : null, null);
        }
    }

    private IReadOnlyList<string> Also(int most) =>
        [.. _candidates.Where(one => one != Best && Errors(one) == most).Select(one => one.Name)];

    private int Errors(CovarianceCandidate candidate) =>
        _claims.Count(claim => claim.StandardError is { } figure && candidate.Error(claim.Label) is { } error && ClaimJudgement.Agrees(figure, error));

    private int Probabilities(CovarianceCandidate candidate) =>
        _claims.Count(claim => claim.P is { } figure && candidate.P(claim.Label).Any(p => ClaimJudgement.Agrees(figure, p)));
}
