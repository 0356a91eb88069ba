using Auditor.Numerics.Factor;
using Auditor.Numerics.Random;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Jarque–Bera check. Null: the errors are normal. n/6 (S² + K²/4), S and K the moment skewness and excess kurtosis of the n residuals about their mean (divisor n);
/// chi-square on 2, which is poor below some hundreds of rows. Below 500 p is simulated too: 9,999 vectors of standard normal errors are drawn, the final model's columns
/// are taken out of each as they were out of the errors, and p = (b + 1)/(9,999 + 1), b the draws whose residuals give a statistic at least as large. Residuals do not depend on coefficients or variance
/// (statistic is scale free), so this p is exact at its grid whatever the columns; normal samples instead of residuals reject anything between
/// 0.7 and 10 percent at a level of 5 where columns are many or leverages uneven.
/// </summary>
/// <remarks>
/// Jarque and Bera 1980, Economics Letters 6; simulation: Dufour, Farhat, Gardiol and Khalaf 1998, Econometrics Journal 1 (from memory). Statistic and chi-square p
/// verified against R (tests/reference), simulated p against 400,000 draws in R (ResidualChecks/values of the tests).
/// </remarks>
public static class JarqueBera
{
    private const int SimulatedBelow = 500;
    private const int Draws = 9999;
    private const int Fewest = 3;
    private const int BlockRows = 1 << 16;

    /// <summary>Statistics this near to each other, relatively, are the same.</summary>
    private const double Tie = 1e-10;

    /// <param name="seed">Seed of the simulation.</param>
    public static CheckOutcome Of(CheckedFit fit, ulong seed)
    {
        if (fit.ShapeImpediment(Fewest, double.PositiveInfinity) is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var n = fit.Fit.N;
        var (skewness, excess) = Shape(fit.Store, n);
        var check = ChiSquaredCheck.Of(
            Statistic(skewness, excess, n), 2, new CheckSize(SizeMeasure.Skewness, skewness), new CheckSize(SizeMeasure.ExcessKurtosis, excess));
        return n < SimulatedBelow
            ? check with { SimulatedP = Simulate(check.Statistic, ResidualMaker.Of(fit.Design), seed), Draws = Draws }
            : check;
    }

    private static double Statistic(double skewness, double excess, double n) => n / 6 * ((skewness * skewness) + (excess * excess / 4));

    /// <summary>Moment skewness and excess kurtosis of the residuals about their mean, block by block.</summary>
    private static (double Skewness, double Excess) Shape(ResidualStore store, double n)
    {
        var (values, copies) = (new double[Math.Min(BlockRows, store.Count)], new double[Math.Min(BlockRows, store.Count)]);
        var sum = 0.0;
        foreach (var rows in Blocks(store, values, copies))
        {
            sum += BlockKernels.Dot(values.AsSpan(0, rows), copies.AsSpan(0, rows));
        }

        var moments = new Moments(sum / n, n);
        foreach (var rows in Blocks(store, values, copies))
        {
            moments.Add(values.AsSpan(0, rows), copies.AsSpan(0, rows));
        }

        return moments.Shape;
    }

    /// <summary>Loads one block after the other; gives its rows.</summary>
    private static IEnumerable<int> Blocks(ResidualStore store, double[] values, double[] copies)
    {
        copies.AsSpan().Fill(1);
        for (var first = 0; first < store.Count; first += BlockRows)
        {
            var rows = Math.Min(BlockRows, store.Count - first);
            store.Residuals.Read(first, values.AsSpan(0, rows));
            store.Copies?.Read(first, copies.AsSpan(0, rows));
            yield return rows;
        }
    }

    /// <summary>Moment skewness and excess kurtosis about the mean.</summary>
    /// <param name="copies">How many observations each value stands for.</param>
    /// <param name="n">Their sum.</param>
    private static (double Skewness, double Excess) Shape(ReadOnlySpan<double> values, ReadOnlySpan<double> copies, double n)
    {
        var moments = new Moments(BlockKernels.Dot(values, copies) / n, n);
        moments.Add(values, copies);
        return moments.Shape;
    }

    private static double Simulate(double observed, ResidualMaker residuals, ulong seed)
    {
        var generator = new Generator(seed, (ulong)residuals.N);
        var (sample, ones, larger) = (new double[residuals.N], Enumerable.Repeat(1.0, residuals.N).ToArray(), 0);
        for (var draw = 0; draw < Draws; draw++)
        {
            foreach (ref var value in sample.AsSpan())
            {
                value = generator.Normal();
            }

            residuals.Take(sample);
            var (skewness, excess) = Shape(sample, ones, residuals.N);
            larger += Statistic(skewness, excess, residuals.N) >= observed * (1 - Tie) ? 1 : 0;
        }

        return (larger + 1.0) / (Draws + 1);
    }

    /// <summary>Central moments, divisor n.</summary>
    private sealed class Moments(double mean, double n)
    {
        private double _second;
        private double _third;
        private double _fourth;

        public (double Skewness, double Excess) Shape => (_third / Math.Pow(_second, 1.5), (_fourth / (_second * _second)) - 3);

        public void Add(ReadOnlySpan<double> values, ReadOnlySpan<double> copies)
        {
            for (var i = 0; i < values.Length; i++)
            {
                var d = values[i] - mean;
                _second += copies[i] * d * d / n;
                _third += copies[i] * d * d * d / n;
                _fourth += copies[i] * d * d * d * d / n;
            }
        }
    }
}
