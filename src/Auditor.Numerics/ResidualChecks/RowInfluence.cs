using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// How one row bears on the fit, n observations and rank r. Nulls: the row has leverage 1, so the fit without it says nothing of it; or no degrees of freedom
/// are left without it; or the fit without it is perfect.
/// </summary>
/// <param name="Position">0-based, within the row set.</param>
/// <param name="StudentisedResidual">Externally: e / (s_(i) sqrt(1 - h)), t on n - r - 1.</param>
/// <param name="CooksDistance">e² h / (r s² (1 - h)²).</param>
/// <param name="Dffits">Studentised residual times sqrt(h / (1 - h)).</param>
/// <param name="AloneSpoilsTheFit">Without this row the model fits to rounding: its studentised residual has no finite value.</param>
/// <remarks>
/// Belsley, Kuh and Welsch 1980; Cook 1977, Technometrics 19. Of one copy under frequency weights. Verified against R's influence.measures and 100-digit
/// arithmetic (tests/reference).
/// </remarks>
public readonly record struct RowInfluence(
    int Position, double Leverage, double? StudentisedResidual, double? CooksDistance, double? Dffits, bool AloneSpoilsTheFit)
{
    /// <summary>RSS less what the row takes away, below this share of it, is cancellation.</summary>
    private const double Cancelled = 1e-13;

    public bool HasLeverageOne => 1 - Leverage <= GroupAccumulator.LeverageOne;

    /// <summary>Every row, in order; none for a fit without residuals.</summary>
    public static IEnumerable<RowInfluence> OfAll(CheckedFit fit) => Of(fit, Enumerable.Range(0, fit.Store.Count));

    /// <summary>The rows at some positions; none for a fit without residuals.</summary>
    public static IEnumerable<RowInfluence> Of(CheckedFit fit, IEnumerable<int> positions) => HasResiduals(fit.Fit) ? positions.Select(i => Of(fit, i)) : [];

    internal static bool HasResiduals(Fit fit) => fit.Sigma is > 0 && !fit.Perfect;

    /// <param name="i">The row's position.</param>
    internal static RowInfluence Of(CheckedFit fit, int i)
    {
        var (e, h) = (fit.Store.Residuals[i], Math.Min(1, fit.Store.Leverages[i]));
        var free = 1 - h;
        if (free <= GroupAccumulator.LeverageOne)
        {
            return new RowInfluence(i, h, null, null, null, false);
        }

        var meanSquare = fit.Fit.Rss / fit.Fit.ResidualDf;
        var cook = fit.Fit.Rank == 0 ? 0 : e * e * h / (fit.Fit.Rank * meanSquare * free * free);
        var df = fit.Fit.ResidualDf - 1;
        var without = fit.Fit.Rss - (e * e / free);
        var perfect = without <= Cancelled * fit.Fit.Rss || PerfectFit.Is(fit.Final, without);
        if (df <= 0 || perfect)
        {
            return new RowInfluence(i, h, null, cook, null, df > 0);
        }

        var studentised = e / Math.Sqrt(without / df * free);
        return new RowInfluence(i, h, studentised, cook, studentised * Math.Sqrt(h / free), false);
    }
}
