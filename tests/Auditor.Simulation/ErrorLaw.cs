using Auditor.Numerics.Random;

namespace Auditor.Simulation;

/// <summary>How the errors of a cell are made. Variances are set by the row's first tested column z.</summary>
/// <param name="RareGroup">z is 1 in every tenth row and 0 elsewhere; otherwise a standard normal number.</param>
/// <param name="HasGoal">The verdict has a goal under normal errors of any variance; skewed and heavy-tailed errors are shown beside.</param>
/// <param name="Variance">Of the error of a row, given z.</param>
/// <param name="Draw">An error of mean 0 and variance 1.</param>
internal sealed record ErrorLaw(string Name, bool RareGroup, bool HasGoal, Func<double, double> Variance, Func<Generator, double> Draw)
{
    private const double LogNormalMean = 1.6487212707001282; // exp(1/2)
    private const double LogNormalSpread = 2.1611974158950877; // sqrt(e (e - 1))

    public static IReadOnlyList<ErrorLaw> All { get; } =
    [
        Normal("equal variances", false, _ => 1),
        Normal("variance exp(z)", false, Math.Exp),
        Normal("variance 0.1 + z²", false, z => 0.1 + (z * z)),
        Normal("variance exp(-z²)", false, z => Math.Exp(-z * z)),
        Normal("z a 10 % group, equal variances", true, _ => 1),
        Normal("z a 10 % group, variance 9 in it", true, z => 1 + (8 * z)),
        Normal("z a 10 % group, variance 9 outside", true, z => 9 - (8 * z)),
        new("skewed (log-normal)", false, false, _ => 1, g => (Math.Exp(g.Normal()) - LogNormalMean) / LogNormalSpread),
        new("heavy tails (t on 4 df)", false, false, _ => 1, HeavyTailed),
    ];

    private static ErrorLaw Normal(string name, bool rareGroup, Func<double, double> variance) =>
        new("normal, " + name, rareGroup, true, variance, g => g.Normal());

    /// <summary>t on 4 df over its standard deviation sqrt(2): a chi-square on 4 df is -2 log of the product of two uniforms.</summary>
    private static double HeavyTailed(Generator g) => g.Normal() / Math.Sqrt(-Math.Log(g.Uniform() * g.Uniform()));
}
