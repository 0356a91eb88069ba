using Auditor.Numerics.Factor;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// The first nu = floor(0.4 T^(2/3)) cosines over T periods, which turn score sums by period into nu nearly independent vectors
/// L_j = sqrt(2/T) sum_t s_t cos(pi j (t - 1/2)/T), with O = (1/nu) sum L_j L_j' the long-run variance of the sums.
/// </summary>
/// <remarks>Lazarus, Lewis, Stock and Watson 2018, Journal of Business and Economic Statistics 36 (from memory).</remarks>
internal sealed class Cosines(int periods)
{
    public int Count { get; } = Number(periods);

    /// <summary>The largest nu with nu³ at most 0.064 T², in whole numbers: roots would miss the exact cases.</summary>
    public static int Number(int periods)
    {
        Int128 bound = (Int128)8 * periods * periods;
        var nu = (int)(0.4 * Math.Pow(periods, 2.0 / 3));
        while (Cube(nu + 1) <= bound)
        {
            nu++;
        }

        while (Cube(nu) > bound)
        {
            nu--;
        }

        return nu;
    }

    /// <summary>sqrt(2/T) cos(pi j (t + 1/2)/T), j = 1 … nu, t = 0 … T - 1.</summary>
    public double At(int j, int t) => Math.Sqrt(2.0 / periods) * Math.Cos(Math.PI * j * (t + 0.5) / periods);

    /// <summary>T O, q x q: the variance of the sum of all scores.</summary>
    public double[,] Variance(int q, Quadratic.Vector scores)
    {
        var sums = new double[Count][];
        for (var j = 0; j < Count; j++)
        {
            sums[j] = new double[q];
            for (var t = 0; t < periods; t++)
            {
                BlockKernels.AddScaled(sums[j], At(j + 1, t), scores(t));
            }
        }

        return Quadratic.Products(q, Count, j => sums[j], (double)periods / Count);
    }

    private static Int128 Cube(int nu) => (Int128)125 * nu * nu * nu;
}
