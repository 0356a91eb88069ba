using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>The figures of one test, judged together by the form that reproduces most of them, the first on a tie: F, df and p of one test are of one form.</summary>
internal static class TestClaims
{
    public static IEnumerable<ClaimResult> Of(ClaimedTest claimed, IReadOnlyList<TestForm> forms, string? why, ClaimJudgement judgement)
    {
        var best = forms.OrderByDescending(form => claimed.All.Count(claim => Agrees(claimed, claim, form))).FirstOrDefault();
        foreach (var claim in claimed.All)
        {
            yield return judgement.Of(claim, best is null ? [] : [.. Value(claimed, claim, best)], why);
        }
    }

    private static bool Agrees(ClaimedTest claimed, ClaimedFigure claim, TestForm form) =>
        Value(claimed, claim, form).Any(value => ClaimJudgement.Agrees(claim, value));

    private static IEnumerable<Reproduction> Value(ClaimedTest claimed, ClaimedFigure claim, TestForm form) => Reproduction.Of(
        claim == claimed.F ? form.F : claim == claimed.Df1 ? form.Df1 : claim == claimed.Df2 ? form.Df2 : form.P, form.By, form.OtherRows, ClaimedRows.FitDigits);
}
