using Auditor.Analysis.Claims.Relations;
using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>Every relation that reported figures must meet whatever the data are; one more relation is one more line.</summary>
internal static class ClaimRelations
{
    public static IReadOnlyList<ClaimRelation> Of(DeclaredClaims claims, ReportedFit fit)
    {
        ClaimedTest[] tests = [.. claims.Groups, .. claims.Steps];
        return
        [
            .. PossibleValues.Of(claims.All),
            .. AdjustedFromRSquared.Of(fit),
            .. OverallFFromRSquared.Of(fit),
            .. CoefficientPFromT.Of(fit),
            .. tests.SelectMany(TestPFromF.Of),
            .. tests.SelectMany(test => TestDfWithinRows.Of(test, fit)),
        ];
    }
}
