using Auditor.Numerics.Distributions;
using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>
/// p is two-sided, of t = estimate / standard error: on n - r degrees of freedom, or normal as large-sample programs have it, so anything between
/// the two is let pass. Where rows come in clusters the degrees of freedom are not known, and nothing is said.
/// </summary>
internal static class CoefficientPFromT
{
    public static IEnumerable<ClaimRelation> Of(ReportedFit fit) =>
        fit.OneScale && (fit.Df ?? fit.RefitDf) is > 0 and var df
            ? fit.Figures.Coefficients.SelectMany(coefficient => Of(coefficient, df))
            : [];

    private static IEnumerable<ClaimRelation> Of(ClaimedCoefficient coefficient, double df)
    {
        if (coefficient is not { Estimate: { } estimate, StandardError: { } error, P: { } p })
        {
            yield break;
        }

        var size = Size(Interval.Of(estimate.Printed, double.NegativeInfinity, double.PositiveInfinity));
        var spread = Interval.Of(error.Printed, 0, double.PositiveInfinity);
        if (spread.High <= 0)
        {
            yield break;
        }

        var t = new Interval(size.Low / spread.High, spread.Low > 0 ? size.High / spread.Low : double.PositiveInfinity);
        var least = double.IsInfinity(t.High) ? 0 : StudentT.TwoSided(t.High, double.PositiveInfinity);
        yield return Relation.Of(
            p, Interval.Of(p.Printed, 0, 1), [estimate, error], new Interval(least, StudentT.TwoSided(t.Low, df)), "p of a coefficient follows from its estimate and standard error");
    }

    private static Interval Size(Interval estimate) => estimate is { Low: <= 0, High: >= 0 }
        ? new Interval(0, Math.Max(-estimate.Low, estimate.High))
        : new Interval(Math.Min(Math.Abs(estimate.Low), Math.Abs(estimate.High)), Math.Max(Math.Abs(estimate.Low), Math.Abs(estimate.High)));
}
