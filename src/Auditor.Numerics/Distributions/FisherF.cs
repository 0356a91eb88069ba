namespace Auditor.Numerics.Distributions;

/// <summary>
/// The F distribution with real degrees of freedom: the ratio of two independent chi-squared variables, each over its own.
/// P(F &lt;= f) is the regularised incomplete beta function I_x(df1/2, df2/2) at x = df1 f/(df1 f + df2).
/// </summary>
/// <remarks>
/// Arguments: f in [0, +inf] (between 0 and 1e-280 it is taken as 1e-280); df1 and df2 above 0, at most one of them infinite (df2 = +inf is chi-squared over df1). Anything else throws.
/// Verified to 1e-10 relative, on the logarithm where that is asked, against 80-digit values (a hypergeometric series, and quadrature of
/// the density) for df1 from 0.02 to 1e10 and df2 from 0.2 to 3e12, tails down to exp(-46000), and against printed critical values of R 4.2.2.
/// A double holds f to 1e-16 only: where the tail falls like f to the power -k, that alone moves its value by k times 1e-16.
/// Below df1 or df2 of about 0.01 the tail taken as a complement slowly loses digits. Cost: a microsecond or two, some twenty
/// at most, when both are in the millions. How: see <see cref="BetaTail"/>.
/// </remarks>
public static class FisherF
{
    private const int MostSteps = 2000;
    private const double SmallestF = 1e-280;

    /// <summary>A Newton step in log f whose square, the error that is left after it, no longer counts.</summary>
    private const double Settled = 1e-10;

    /// <summary>P(F > f), the p-value of an F test, with full relative accuracy in the tail; 0 below the smallest double.</summary>
    public static double Survival(double f, double df1, double df2) => Checked(f, df1, df2) switch
    {
        0 => 1,
        double.PositiveInfinity => 0,
        _ => BetaTail.At(f, df1 / 2, df2 / 2).Upper,
    };

    /// <summary>Natural logarithm of P(F > f), finite also where that probability is below the smallest double; -inf only at f = +inf.</summary>
    public static double LogSurvival(double f, double df1, double df2) => Checked(f, df1, df2) switch
    {
        0 => 0,
        double.PositiveInfinity => double.NegativeInfinity,
        _ => BetaTail.At(f, df1 / 2, df2 / 2).LogUpper,
    };

    /// <summary>P(F &lt;= f), with full relative accuracy where it is small.</summary>
    public static double Cumulative(double f, double df1, double df2) => Checked(f, df1, df2) switch
    {
        0 => 0,
        double.PositiveInfinity => 1,
        _ => BetaTail.At(f, df1 / 2, df2 / 2).Lower,
    };

    /// <summary>
    /// The critical value: f with P(F > f) = p. p = 0 gives +inf, p = 1 gives 0; +inf also where f would be above the largest double.
    /// </summary>
    /// <remarks>
    /// Newton's method on the logarithm of the smaller tail as a function of log f, where it is concave, so that the steps cannot cycle.
    /// Verified to 1e-10 relative against 80-digit inverses, p from 1e-287 to 0.9999994.
    /// </remarks>
    public static double UpperQuantile(double p, double df1, double df2)
    {
        CheckProbability(p);
        CheckDegrees(df1, df2);
        return p switch
        {
            0 => double.PositiveInfinity,
            1 => 0,
            <= 0.5 => Invert(Math.Log(p), df1 / 2, df2 / 2, upper: true),
            _ => Invert(Math.Log(1 - p), df1 / 2, df2 / 2, upper: false),
        };
    }

    internal static void CheckProbability(double p)
    {
        if (p is not (>= 0 and <= 1))
        {
            throw new ArgumentOutOfRangeException(nameof(p), "A probability lies in [0, 1].");
        }
    }

    /// <summary>f as it is used: what lies between 0 and <see cref="SmallestF"/> is taken as that.</summary>
    internal static double Checked(double f, double df1, double df2)
    {
        CheckDegrees(df1, df2);
        return f switch
        {
            0 => 0,
            > 0 => Math.Max(f, SmallestF),
            _ => throw new ArgumentOutOfRangeException(nameof(f), "An F statistic is at least 0."),
        };
    }

    private static void CheckDegrees(double df1, double df2)
    {
        if (!(df1 > 0 && df2 > 0) || (double.IsInfinity(df1) && double.IsInfinity(df2)))
        {
            throw new ArgumentOutOfRangeException(nameof(df1), "Degrees of freedom are above 0, and at most one of them is infinite.");
        }
    }

    private static double Invert(double logTarget, double a, double b, bool upper)
    {
        double f = 1;
        double reach = 2; // a longest step in log f, doubled each time it binds
        for (int step = 0; step < MostSteps; step++)
        {
            BetaTail tail = BetaTail.At(f, a, b);
            double logTail = upper ? tail.LogUpper : tail.LogLower;
            double move = (logTail - logTarget) * Math.Exp(logTail - tail.LogDensity);
            if (Math.Abs(move) > reach)
            {
                move = Math.CopySign(reach, move);
                reach *= 2;
            }

            double next = f * Math.Exp(upper ? move : -move);
            if (double.IsInfinity(next) || next == 0)
            {
                return next;
            }

            f = next;
            if (Math.Abs(move) < Settled)
            {
                break;
            }
        }

        return f;
    }
}
