using Auditor.Numerics.Random;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Jarque–Bera check. Null: the errors are normal. n/6 (S² + K²/4), S and K the moment skewness and excess kurtosis of the n residuals about their mean (divisor n);
/// chi-square on 2, which is poor below some hundreds of rows: there p is simulated too, from normal samples of the same size.
/// </summary>
/// <remarks>Jarque and Bera 1980, Economics Letters 6. Statistic and chi-square p verified against R (tests/reference).</remarks>
public static class JarqueBera
{
    private const int SimulatedBelow = 500;
    private const int Draws = 4999;

    /// <param name="seed">Seed of the simulation.</param>
    public static CheckOutcome Of(CheckedFit fit, ulong seed)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var n = fit.Fit.N;
        if (Statistic(fit.Store.Counted, n) is not double value)
        {
            return CheckOutcome.None(CheckImpediment.TooFew);
        }

        return ChiSquaredCheck.Of(value, 2) with { SimulatedP = n < SimulatedBelow ? Simulate(value, (int)n, seed) : null };
    }

    /// <summary>The statistic of n values, each with its number of copies; null when there are fewer than 3 or they do not vary.</summary>
    internal static double? Statistic(IEnumerable<(double Value, double Copies)> values, double n)
    {
        var counted = values as IReadOnlyList<(double Value, double Copies)> ?? [.. values];
        var mean = counted.Sum(one => one.Copies * one.Value / n);
        var (second, third, fourth) = (0.0, 0.0, 0.0);
        foreach (var (value, copies) in counted)
        {
            var d = value - mean;
            second += copies * d * d / n;
            third += copies * d * d * d / n;
            fourth += copies * d * d * d * d / n;
        }

        var (skewness, excess) = (third / Math.Pow(second, 1.5), (fourth / (second * second)) - 3);
        var statistic = n / 6 * ((skewness * skewness) + (excess * excess / 4));
        return n >= 3 && double.IsFinite(statistic) ? statistic : null;
    }

    /// <summary>(b + 1) / (B + 1), b the draws with a statistic at least as large.</summary>
    private static double Simulate(double observed, int n, ulong seed)
    {
        var generator = new Generator(seed, (ulong)n);
        var (sample, larger) = (new (double, double)[n], 0);
        for (var draw = 0; draw < Draws; draw++)
        {
            for (var i = 0; i < n; i++)
            {
                sample[i] = (generator.Normal(), 1);
            }

            larger += Statistic(sample, n) >= observed ? 1 : 0;
        }

        return (larger + 1.0) / (Draws + 1);
    }
}
