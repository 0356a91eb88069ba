namespace Auditor.Numerics.Distributions;

/// <summary>
/// The pieces from which the prefactors of gamma and beta tails are put together without cancellation
/// (the saddle-point form of Loader 2000, "Fast and accurate computation of binomial probabilities").
/// </summary>
internal static class Deviance
{
    private const double AsymptoticFrom = 16;

    /// <summary>Every normal tail asks for it.</summary>
    private static readonly double _errorAtHalf = ComputeStirlingError(0.5);

    /// <summary>u - log(1 + u) for u > -1, to a few units of the last place also where u is near 0.</summary>
    public static double Excess(double u)
    {
        if (u is < -0.5 or > 1)
        {
            return u - Log1P(u);
        }

        // With r = u/(2+u): log(1+u) = 2(r + r³/3 + r⁵/5 + …) and u - 2r = u r, so the linear part has gone.
        double r = u / (2 + u);
        double square = r * r;
        double power = square;
        double sum = 0;
        for (int odd = 3; odd < 99; odd += 2)
        {
            double next = sum + (power / odd);
            if (next == sum)
            {
                break;
            }

            sum = next;
            power *= square;
        }

        return r * (u - (2 * sum));
    }

    /// <summary>log(1 + u) for u > -1 with full relative accuracy near 0 (the correction of the rounding of 1 + u; from memory, common practice).</summary>
    public static double Log1P(double u)
    {
        double sum = 1 + u;
        return sum == 1 ? u : double.IsInfinity(sum) ? sum : Math.Log(sum) - ((sum - 1 - u) / sum);
    }

    /// <summary>log(1 - exp(v)) for v below 0.</summary>
    public static double LogComplement(double v) =>
        v > -Math.Log(2) ? Math.Log(OneMinusExp(v)) : Log1P(-Math.Exp(v));

    /// <summary>1 - exp(v), with full relative accuracy near 0.</summary>
    public static double OneMinusExp(double v)
    {
        if (v < -0.5)
        {
            return 1 - Math.Exp(v);
        }

        // 1 - exp(v) = -2 sinh(v/2) exp(v/2), and the runtime's sinh keeps its digits near 0.
        return -2 * Math.Sinh(v / 2) * Math.Exp(v / 2);
    }

    /// <summary>
    /// log gamma(z) - [(z - 1/2) log z - z + log(2 pi)/2] for z > 0: what Stirling's formula leaves out. 0 at infinity.
    /// </summary>
    public static double StirlingError(double z) => z == 0.5 ? _errorAtHalf : ComputeStirlingError(z);

    private static double ComputeStirlingError(double z)
    {
        double sum = 0;
        for (; z < AsymptoticFrom; z++)
        {
            sum += OneStep(z);
        }

        double v = 1 / z;
        double w = v * v;
        return sum + (v * ((1.0 / 12) - (w * ((1.0 / 360) - (w * ((1.0 / 1260) - (w * ((1.0 / 1680)
            - (w * ((1.0 / 1188) - (w * ((691.0 / 360360) - (w * (1.0 / 156))))))))))))));
    }

    /// <summary>The error at z less the error at z + 1: (z + 1/2) log(1 + 1/z) - 1, by its series where that cancels.</summary>
    private static double OneStep(double z)
    {
        if (z < 1)
        {
            return ((z + 0.5) * (Log1P(z) - Math.Log(z))) - 1;
        }

        double r = 1 / ((2 * z) + 1);
        double square = r * r;
        double power = square;
        double sum = 0;
        for (int odd = 3; power > 1e-18; odd += 2)
        {
            sum += power / odd;
            power *= square;
        }

        return sum;
    }
}
