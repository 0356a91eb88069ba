using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>
/// A test of what is added to the final model has at most n - r - df1 residual degrees of freedom, n the rows of the final model: a group with missing
/// values has fewer rows, never more, and larger models have fewer still.
/// </summary>
internal static class TestDfWithinRows
{
    public static IEnumerable<ClaimRelation> Of(ClaimedTest test, ReportedFit fit)
    {
        if (test is not { Df1: { } df1, Df2: { } df2 } || fit.Rows is not double rows)
        {
            yield break;
        }

        var most = rows - fit.Rank - df1.Printed.Value;
        yield return Relation.Of(
            df2,
            Interval.Of(df2.Printed, 0, double.PositiveInfinity),
            [fit.Figures.Rows, df1],
            new Interval(double.NegativeInfinity, most),
            "the residual degrees of freedom of a test are at most the rows less the coefficients of the model and the first degrees of freedom");
    }
}
