using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>
/// The figures of the final model judged on one row set, since one fit has one set of rows: the set that reproduces most of them, the fit shown on a
/// tie. A figure that only the set not chosen would reproduce is not called right, but it is said.
/// </summary>
internal sealed class FitClaimsOnRows
{
    public FitClaimsOnRows(ClaimedFit claimed, IReadOnlyList<ClaimedRows> rows, ClaimJudgement judgement)
    {
        var judged = rows.Select(one => new FitClaims(claimed, one, judgement)).Select(claims => (claims.All, claims.StandardErrors)).ToList();
        var best = judged.OrderByDescending(one => one.All.Count(Agrees)).First();
        StandardErrors = best.StandardErrors;
        Figures = [.. best.All.Select((figure, k) => Agrees(figure) || !judged.Any(one => Agrees(one.All[k])) ? figure : figure with { Why = Elsewhere(rows.Count > 1 && best == judged[0]) })];
    }

    public IReadOnlyList<ClaimResult> Figures { get; }

    public StandardErrorsReproduced? StandardErrors { get; }

    private static bool Agrees(ClaimResult figure) => figure.Outcome == ClaimOutcomes.Agrees;

    private static string Elsewhere(bool shown) => shown
        ? "the other row set would reproduce this figure, but not as many of the others"
        : "the fit shown would reproduce this figure, but not as many of the others";
}
