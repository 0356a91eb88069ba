using MathNet.Numerics.Integration;

namespace Auditor.Numerics.Distributions;

/// <summary>
/// Both tails of the ratio F = (G_a/a)/(G_b/b) of independent standard gamma variables, that is of F(2a, 2b), at one point:
/// the regularised incomplete beta function with x = a f/(a f + b), in a form that keeps its digits when b is huge.
/// One of the two tails is held directly as exp(LogDensity) * Ratio, the other is its complement.
/// </summary>
/// <remarks>
/// b enters only through 1/b, so b = +inf (the gamma distribution) needs no code of its own. Nothing is formed as 1 - x: x, 1 - x and
/// a(1-x) - b x all come from f and h = f - 1. Prefactor x^a (1-x)^b / B(a, b): Stirling errors and deviances as in Loader 2000.
/// Lower tail: the series of positive terms DLMF 8.17.7 (a form of 2F1(a+b, 1; a+1; x)). Upper tail: the continued fraction of
/// DiDonato and Morris 1992 (TOMS 708), by the modified Lentz method. Their work grows like the square root of min(a, b); where that is above
/// a million, the nearly normal density is integrated instead, at a fixed cost.
/// </remarks>
internal readonly record struct BetaTail
{
    private const double Tiny = 1e-300;
    private const double Vanishing = 1e-305;
    private const double IntegratedFrom = 1e6;
    private static readonly GaussLegendreRule Rule = new(0, 1, 64);

    private BetaTail(bool holdsLower, double logDensity, double ratio)
    {
        HoldsLower = holdsLower;
        LogDensity = logDensity;
        Ratio = ratio;
    }

    /// <summary>log of f times the density at f, the same as log of x^a (1-x)^b / B(a, b).</summary>
    public double LogDensity { get; }

    public double LogLower => HoldsLower ? LogHeld : Deviance.LogComplement(LogHeld);

    public double LogUpper => HoldsLower ? Deviance.LogComplement(LogHeld) : LogHeld;

    public double Lower => HoldsLower ? Held : 1 - Held;

    public double Upper => HoldsLower ? 1 - Held : Held;

    private bool HoldsLower { get; }

    private double Ratio { get; }

    private double LogHeld => Math.Min(LogDensity + Math.Log(Ratio), 0);

    private double Held => Math.Min(Math.Exp(LogHeld), 1);

    /// <summary>The tails at 0 &lt; f &lt; +inf (below 1e-305 as at 0); a and b above 0, at most one of them infinite.</summary>
    public static BetaTail At(double f, double a, double b)
    {
        if (f < Vanishing)
        {
            return new BetaTail(holdsLower: true, double.NegativeInfinity, 1);
        }

        double h = f - 1;
        if (a <= b)
        {
            return Ordered(f, h, a, 1 / b);
        }

        // 1/F is F with the parameters exchanged, and 1/f - 1 = -h/f keeps its digits near 1.
        BetaTail mirrored = Ordered(1 / f, -h / f, b, 1 / a);
        return new BetaTail(!mirrored.HoldsLower, mirrored.LogDensity, mirrored.Ratio);
    }

    private static BetaTail Ordered(double f, double h, double a, double t)
    {
        if (t == 0 && double.IsInfinity(a * f))
        {
            return new BetaTail(holdsLower: false, double.NegativeInfinity, 1);
        }

        double odds = a * t * f;
        double y = 1 / (1 + odds);
        double x = odds < 1 ? odds * y : 1 / (1 + (1 / odds));
        double logDensity = LogDensityAt(f, h, a, t);
        if (a > IntegratedFrom)
        {
            return new BetaTail(h < 0, logDensity, Integral(f, h, a, t, y, logDensity));
        }

        bool lower = a * (f * y) * (1 + ((a + 2) * t)) < a + 1;
        return new BetaTail(lower, logDensity, lower ? LowerSeries(a, t, a * (f * y)) : UpperFraction(a, t, h, x, y));
    }

    private static double LogDensityAt(double f, double h, double a, double t)
    {
        double share = a * t / (1 + (a * t)); // a/(a+b), at most 1/2
        double divergence = h is > -0.7 and < 2
            ? Deviance.Excess(h) - OverShare(Deviance.Excess(share * h), 0)
            : OverShare(Deviance.Log1P(share * h), h) - Math.Log(f);
        double stirling = t == 0 ? 0 : Deviance.StirlingError((1 / t) + a) - Deviance.StirlingError(1 / t);
        return (0.5 * Math.Log(a / (1 + (a * t)) / (2 * Math.PI))) + (stirling - Deviance.StirlingError(a)) - (a * divergence);

        double OverShare(double value, double limit) => share * Math.Abs(h) < 1e-200 ? limit : value / share;
    }

    /// <summary>Lower tail over prefactor: (1/a) sum of (a+b)_k/(a+1)_k x^k; scaled = b x.</summary>
    private static double LowerSeries(double a, double t, double scaled)
    {
        double term = 1;
        double sum = 1;
        for (double k = a; term > sum * 1e-17; k++)
        {
            term *= scaled * (1 + (k * t)) / (k + 1);
            sum += term;
        }

        return sum / a;
    }

    /// <summary>Upper tail over prefactor.</summary>
    private static double UpperFraction(double a, double t, double h, double x, double y)
    {
        double lambda = a * y * h; // b - (a+b) y
        double c = Floor((lambda + 1) / (1 + t));
        double d = 0;
        double value = c;
        double change = 0;
        for (int m = 1; Math.Abs(change - 1) > 4e-16 && m < int.MaxValue; m++)
        {
            double v = 1 / (1 + (((2.0 * m) - 1) * t));
            double inner = m * (a - m) * y * v;
            double alpha = inner * y * v * (1 + ((m - 1) * t)) * (1 + ((a + m - 1) * t));
            double beta = m + (inner * t) + ((1 + (m * t)) * (lambda + 1 + (m * (1 + x))) / (1 + (((2.0 * m) + 1) * t)));
            d = 1 / Floor(beta + (alpha * d));
            c = Floor(beta + (alpha / c));
            change = c * d;
            value *= change;
        }

        return 1 / value;
    }

    /// <summary>
    /// Tail over prefactor on the side away from f = 1, as the integral of the density over log f. It is so nearly normal here that a stretch of
    /// 40 in the exponent and 64 nodes do.
    /// </summary>
    private static double Integral(double f, double h, double a, double t, double y, double logDensity)
    {
        double slope = a * y * Math.Abs(h);
        double curvature = a * (f * y) * y * (1 + (a * t)); // in this order f y, below 1/(a t), cannot overflow
        double stretch = (h < 0 ? -80 : 80) / (slope + Math.Sqrt((slope * slope) + (80 * curvature)));
        double sum = 0;
        for (int i = 0; i < Rule.Order; i++)
        {
            double s = stretch * Rule.Abscissas[i];
            double there = h - (f * Deviance.OneMinusExp(s));
            sum += Rule.Weights[i] * Math.Exp(LogDensityAt(f * Math.Exp(s), there, a, t) - logDensity);
        }

        return sum * Math.Abs(stretch);
    }

    private static double Floor(double v) => Math.Abs(v) < Tiny ? Tiny : v;
}
