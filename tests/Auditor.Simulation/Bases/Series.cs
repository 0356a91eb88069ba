using Auditor.Numerics.Random;

namespace Auditor.Simulation.Bases;

/// <summary>Series in time.</summary>
internal static class Series
{
    /// <summary>Autoregressive of order 1, mean 0, variance 1 from the start; with rho = 1 a random walk, over the square root of its length.</summary>
    public static double[] Of(Generator random, int periods, double rho)
    {
        var series = new double[periods];
        var (last, step) = rho < 1 ? (random.Normal(), Math.Sqrt(1 - (rho * rho))) : (0, 1 / Math.Sqrt(periods));
        for (var t = 0; t < periods; t++)
        {
            last = t > 0 || rho >= 1 ? (rho * last) + (step * random.Normal()) : last;
            series[t] = last;
        }

        return series;
    }

    /// <summary>Mean over the periods of such a series' variance.</summary>
    public static double Variance(int periods, double rho) => rho < 1 ? 1 : (periods + 1) / (2.0 * periods);
}
