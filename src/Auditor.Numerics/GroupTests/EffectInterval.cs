using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Equal-tailed interval of the partial R² by inverting the noncentral F: the noncentralities at which the observed F has upper, and lower, tail
/// probability alpha; f² = lambda / rows, partial R² = f² / (1 + f²).
/// </summary>
/// <param name="Lower">0 when the central F already puts the observed one below its upper alpha point.</param>
/// <remarks>
/// Steiger 2004, Psychological Methods 9; Smithson 2003; noncentrality f² (df1 + df2 + 1) after Cohen 1988. Verified against tests/reference
/// (noncentrality) and tests/vectors/effective_rows.json.
/// </remarks>
public sealed record EffectInterval(double Lower, double Upper)
{
    /// <param name="test">The F test that V gives (partial F for the classical interval).</param>
    /// <param name="rows">Effective rows under the same V.</param>
    /// <param name="alpha">Probability in each tail: the interval is at 1 - 2 alpha.</param>
    /// <returns>Null when a limit is out of reach.</returns>
    public static EffectInterval? Of(FTest test, EffectiveRows rows, double alpha)
    {
        var lower = NoncentralF.Noncentrality(test.Statistic, test.Df1, test.Df2, 1 - alpha);
        var upper = NoncentralF.Noncentrality(test.Statistic, test.Df1, test.Df2, alpha);
        return lower is double from && upper is double to
            ? new EffectInterval(Share(from, rows.BestInformed), Share(to, rows.LeastInformed))
            : null;
    }

    private static double Share(double lambda, double rows) => lambda / (lambda + rows);
}
