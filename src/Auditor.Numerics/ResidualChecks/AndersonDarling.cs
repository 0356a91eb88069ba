using Auditor.Numerics.Distributions;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Anderson–Darling check. Null: the errors are normal, mean and standard deviation (divisor n - 1) estimated from the n residuals, 8 to 1,000,000, taken as a sample.
/// A² = -n - (1/n) sum (2i - 1) (log Phi(z_(i)) + log(1 - Phi(z_(n+1-i)))); p from A² (1 + 0.75/n + 2.25/n²).
/// </summary>
/// <remarks>
/// Stephens in D'Agostino and Stephens 1986, Goodness-of-Fit Techniques, table 4.9 (from memory). Verified against R's nortest (tests/reference);
/// the formula of p ends at an adjusted A² of 10, where p is 3.7e-24: above that p is only known to be smaller.
/// </remarks>
public static class AndersonDarling
{
    private const double Most = 1e6;
    private const double Fewest = 8;
    private const double LargestForP = 10;
    private const int PartRows = 1 << 16;

    public static CheckOutcome Of(CheckedFit fit) =>
        fit.ShapeImpediment(Fewest, Most) is { } impediment ? CheckOutcome.None(impediment) : Of(fit.Ordered, fit.Threads);

    private static CheckStatistic Of(double[] ordered, int threads)
    {
        var n = ordered.Length;
        var mean = ordered.Average();
        var sd = Math.Sqrt(ordered.Sum(value => (value - mean) * (value - mean)) / (n - 1));
        var statistic = -n - Sum(ordered, mean, sd, threads);
        var adjusted = statistic * (1 + (0.75 / n) + (2.25 / ((double)n * n)));
        return new CheckStatistic(statistic, null, null, P(adjusted))
        {
            PIsUpperBound = adjusted >= LargestForP,
            Sizes = [new(SizeMeasure.DistanceFromNormal, statistic / n)],
        };
    }

    /// <summary>In parts of fixed size, so that no bit depends on the threads.</summary>
    private static double Sum(double[] ordered, double mean, double sd, int threads)
    {
        var parts = new double[(ordered.Length + PartRows - 1) / PartRows];
        InParallel.Each(parts.Length, threads, part => parts[part] = SumOfPart(ordered, part * PartRows, mean, sd));
        return parts.Sum();
    }

    private static double SumOfPart(double[] ordered, int first, double mean, double sd)
    {
        var (n, sum) = (ordered.Length, 0.0);
        for (var i = first; i < Math.Min(n, first + PartRows); i++)
        {
            var (below, above) = LogTails((ordered[i] - mean) / sd);
            sum += ((((2.0 * i) + 1) * below) + (((2.0 * (n - i)) - 1) * above)) / n;
        }

        return sum;
    }

    /// <summary>log Phi(z) and log(1 - Phi(z)).</summary>
    private static (double Below, double Above) LogTails(double z)
    {
        var far = StandardNormal.LogUpperTail(Math.Abs(z));
        var near = Math.Log(1 - Math.Exp(far));
        return z < 0 ? (far, near) : (near, far);
    }

    private static double P(double a) => a switch
    {
        < 0.2 => 1 - Math.Exp(-13.436 + (101.14 * a) - (223.73 * a * a)),
        < 0.34 => 1 - Math.Exp(-8.318 + (42.796 * a) - (59.938 * a * a)),
        < 0.6 => Math.Exp(0.9177 - (4.279 * a) - (1.38 * a * a)),
        < LargestForP => Math.Exp(1.2937 - (5.709 * a) + (0.0186 * a * a)),
        _ => Math.Exp(1.2937 - (5.709 * LargestForP) + (0.0186 * LargestForP * LargestForP)),
    };
}
