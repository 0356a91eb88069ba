namespace Auditor.Numerics.Distributions;

/// <summary>Exact (Clopper–Pearson) interval of a probability from successes in independent trials.</summary>
/// <param name="Lower">0 when there was no success.</param>
/// <param name="Upper">1 when there was nothing else.</param>
/// <remarks>Clopper and Pearson 1934, Biometrika 26; limits by quantiles of F. Verified against R's binom.test.</remarks>
public sealed record ClopperPearson(double Lower, double Upper)
{
    /// <param name="alpha">Probability in both tails together: the interval is at 1 - alpha.</param>
    public static ClopperPearson Of(long successes, long trials, double alpha)
    {
        var (x, rest) = ((double)successes, (double)(trials - successes));
        var lower = x == 0 ? 0 : x / (x + ((rest + 1) * FisherF.UpperQuantile(alpha / 2, 2 * (rest + 1), 2 * x)));
        var odds = rest == 0 ? 0 : (x + 1) * FisherF.UpperQuantile(alpha / 2, 2 * (x + 1), 2 * rest);
        return new ClopperPearson(lower, rest == 0 ? 1 : odds / (rest + odds));
    }
}
