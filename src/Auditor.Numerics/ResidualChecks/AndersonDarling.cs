using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Anderson–Darling check. Null: the errors are normal, mean and standard deviation (divisor n - 1) estimated from the n residuals, 8 to 1,000,000.
/// A² = -n - (1/n) sum (2i - 1) (log Phi(z_(i)) + log(1 - Phi(z_(n+1-i)))); p from A² (1 + 0.75/n + 2.25/n²).
/// </summary>
/// <remarks>
/// Stephens in D'Agostino and Stephens 1986, Goodness-of-Fit Techniques, table 4.9 (from memory). Verified against R's nortest (tests/reference);
/// p is not told apart below about 1e-20.
/// </remarks>
public static class AndersonDarling
{
    private const double Most = 1e6;
    private const double Fewest = 8;
    private const double LargestForP = 10;

    public static CheckOutcome Of(CheckedFit fit)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var n = fit.Fit.N;
        return n > Most ? CheckOutcome.None(CheckImpediment.TooMany)
            : n < Fewest ? CheckOutcome.None(CheckImpediment.TooFew)
            : Of([.. fit.Store.Expanded().Order()]);
    }

    private static CheckStatistic Of(double[] ordered)
    {
        var n = ordered.Length;
        var mean = ordered.Average();
        var sd = Math.Sqrt(ordered.Sum(value => (value - mean) * (value - mean)) / (n - 1));
        var sum = 0.0;
        for (var i = 0; i < n; i++)
        {
            sum += ((2 * i) + 1.0) / n * (LogBelow((ordered[i] - mean) / sd) + LogBelow(-(ordered[n - 1 - i] - mean) / sd));
        }

        var statistic = -n - sum;
        return new CheckStatistic(statistic, null, null, P(statistic * (1 + (0.75 / n) + (2.25 / ((double)n * n)))));
    }

    /// <summary>log Phi(z), of the asymptotic tail where Phi underflows.</summary>
    private static double LogBelow(double z) =>
        z > -37 ? Math.Log(StandardNormal.UpperTail(-z)) : (-z * z / 2) - Math.Log(-z * Math.Sqrt(2 * Math.PI));

    private static double P(double a) => a switch
    {
        < 0.2 => 1 - Math.Exp(-13.436 + (101.14 * a) - (223.73 * a * a)),
        < 0.34 => 1 - Math.Exp(-8.318 + (42.796 * a) - (59.938 * a * a)),
        < 0.6 => Math.Exp(0.9177 - (4.279 * a) - (1.38 * a * a)),
        < LargestForP => Math.Exp(1.2937 - (5.709 * a) + (0.0186 * a * a)),
        _ => Math.Exp(1.2937 - (5.709 * LargestForP) + (0.0186 * LargestForP * LargestForP)),
    };
}
