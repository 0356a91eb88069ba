using Auditor.Numerics.Distributions;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>How one row bears on the fit. Null values: the row has leverage 1, or without it the fit is perfect or has no degrees of freedom.</summary>
/// <param name="Position">0-based, within the row set.</param>
/// <param name="StudentisedResidual">Externally: e / (s_(i) sqrt(1 - h)), t on n - r - 1.</param>
/// <param name="CooksDistance">e² h / (r s² (1 - h)²).</param>
/// <param name="Dffits">Studentised residual times sqrt(h / (1 - h)).</param>
/// <remarks>Belsley, Kuh and Welsch 1980; Cook 1977, Technometrics 19. Of one copy under frequency weights. Verified against R's influence.measures (tests/reference).</remarks>
public sealed record RowInfluence(int Position, double Leverage, double? StudentisedResidual, double? CooksDistance, double? Dffits)
{
    /// <summary>What is left of RSS without a row, relative to RSS, below which it is rounding: without the row the fit is perfect.</summary>
    private const double Rounding = 1e-12;

    public bool HasLeverageOne => 1 - Leverage <= GroupAccumulator.LeverageOne;

    /// <summary>Every row, in order; empty for a fit without residuals.</summary>
    public static IReadOnlyList<RowInfluence> OfAll(CheckedFit fit) =>
        fit.Fit.Sigma is double sigma && sigma > 0 && !fit.Fit.Perfect
            ? [.. Enumerable.Range(0, fit.Store.Residuals.Count).Select(i => Of(fit, i))]
            : [];

    private static RowInfluence Of(CheckedFit fit, int i)
    {
        var (e, h) = (fit.Store.Residuals[i], Math.Min(1, fit.Store.Leverages[i]));
        var free = 1 - h;
        if (free <= GroupAccumulator.LeverageOne)
        {
            return new RowInfluence(i, h, null, null, null);
        }

        var meanSquare = fit.Fit.Rss / fit.Fit.ResidualDf;
        var without = (fit.Fit.Rss - (e * e / free)) / (fit.Fit.ResidualDf - 1);
        var cook = fit.Fit.Rank == 0 ? 0 : e * e * h / (fit.Fit.Rank * meanSquare * free * free);
        return fit.Fit.ResidualDf > 1 && without * (fit.Fit.ResidualDf - 1) > Rounding * fit.Fit.Rss
            ? new RowInfluence(i, h, e / Math.Sqrt(without * free), cook, e / Math.Sqrt(without * free) * Math.Sqrt(h / free))
            : new RowInfluence(i, h, null, cook, null);
    }
}

/// <summary>
/// Largest residual. Null: no row is out of line. The largest absolute externally studentised residual; p two-sided from t on n - r - 1, times the number of observations
/// (Bonferroni), at most 1.
/// </summary>
/// <remarks>Verified against R (tests/reference).</remarks>
public static class LargestResidual
{
    public static CheckOutcome Of(CheckedFit fit, IReadOnlyList<RowInfluence> rows)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var df = fit.Fit.ResidualDf - 1;
        var studentised = rows.Where(row => row.StudentisedResidual is not null).ToList();
        if (df <= 0 || studentised.Count == 0)
        {
            return CheckOutcome.None(CheckImpediment.TooFew);
        }

        if (rows.Any(row => row.StudentisedResidual is null && !row.HasLeverageOne))
        {
            return CheckOutcome.None(CheckImpediment.PerfectWithoutOneRow);
        }

        var largest = studentised.MaxBy(row => Math.Abs(row.StudentisedResidual!.Value))!;
        var t = largest.StudentisedResidual!.Value;
        return new CheckStatistic(t, df, null, Math.Min(1, fit.Fit.N * StudentT.TwoSided(t, df)))
        {
            Position = largest.Position,
            LogP = Math.Min(0, Math.Log(fit.Fit.N) + StudentT.LogTwoSided(t, df)),
        };
    }
}
