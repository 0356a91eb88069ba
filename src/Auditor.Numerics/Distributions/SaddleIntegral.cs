using System.Numerics;

namespace Auditor.Numerics.Distributions;

/// <summary>
/// The tail of a variable Q at 0 from the logarithm K(s) of E exp(sQ): P(Q > 0) = (1/2πi) ∫ exp(K(s)) / s ds along a vertical line right of 0, P(Q &lt; 0) is minus
/// the same left of 0. The line is laid through the saddle of the integrand, so that nothing cancels and a small tail keeps its digits; the trapezoid rule after s = c + i w sinh t
/// converges geometrically.
/// </summary>
/// <remarks>
/// Imhof 1961, Biometrika 48, integrates along the line through 0; through the saddle: Rice 1980, SIAM Journal on Scientific and Statistical Computing 1 (from memory).
/// Verified against 60-digit integration over eigenvalues (ResidualChecks/values of the tests).
/// </remarks>
internal static class SaddleIntegral
{
    private const double Converged = 1e-13;
    private const double Negligible = 1e-19;
    private const double WidestStep = 0.25;
    private const double Farthest = 200;
    private const int MostHalvings = 6;
    private const int SaddleSteps = 48;
    private static readonly double GoldenShare = (Math.Sqrt(5) - 1) / 2;

    /// <summary>Natural logarithm of the tail on the side of <paramref name="end"/>.</summary>
    /// <param name="logTransform">K, analytic where the real part of s lies between 0 and end.</param>
    /// <param name="end">How far from 0 the line may lie, excluded: positive for P(Q > 0), negative for P(Q &lt; 0).</param>
    public static double LogTail(Func<Complex, Complex> logTransform, double end)
    {
        double Height(double c) => logTransform(c).Real - Math.Log(Math.Abs(c));
        var c = Saddle(Height, end);
        var height = Height(c);
        var width = Width(Height, c, height, end);
        double Share(double t)
        {
            var s = new Complex(c, width * Math.Sinh(t));
            return (Complex.Exp(logTransform(s) - height) / s).Real * Math.Sign(end) * width * Math.Cosh(t);
        }

        return height + Math.Log(Trapezoid(Share) / Math.PI);
    }

    /// <summary>The height is convex between 0 and end: golden section.</summary>
    private static double Saddle(Func<double, double> height, double end)
    {
        var (near, far) = (0.0, end);
        var (a, b) = (end * (1 - GoldenShare), end * GoldenShare);
        var (atA, atB) = (height(a), height(b));
        for (var step = 0; step < SaddleSteps && Math.Abs(far - near) > 1e-3 * Math.Abs(a); step++)
        {
            if (atA < atB)
            {
                (far, b, atB) = (b, a, atA);
                a = far - (GoldenShare * (far - near));
                atA = height(a);
            }
            else
            {
                (near, a, atA) = (a, b, atB);
                b = near + (GoldenShare * (far - near));
                atB = height(b);
            }
        }

        return atA < atB ? a : b;
    }

    /// <summary>One over the root of the height's curvature: how far the integrand reaches beside the saddle.</summary>
    private static double Width(Func<double, double> height, double c, double atC, double end)
    {
        var step = 0.02 * Math.Min(Math.Abs(c), Math.Abs(end - c));
        var curvature = (height(c - step) - (2 * atC) + height(c + step)) / (step * step);
        return curvature > 0 ? 1 / Math.Sqrt(curvature) : Math.Abs(c);
    }

    /// <summary>Integral from 0 to infinity of an even function that falls off exponentially.</summary>
    private static double Trapezoid(Func<double, double> share)
    {
        var centre = share(0) / 2;
        var step = WidestStep;
        var sum = centre + Sum(share, step, step, centre);
        for (var halving = 0; halving < MostHalvings; halving++)
        {
            var between = Sum(share, step / 2, step, centre);
            var (before, after) = (sum * step, (sum + between) * step / 2);
            (sum, step) = (sum + between, step / 2);
            if (Math.Abs(after - before) <= Converged * after)
            {
                return after;
            }
        }

        return sum * step;
    }

    private static double Sum(Func<double, double> share, double first, double step, double scale)
    {
        var (sum, quiet) = (0.0, 0);
        for (var t = first; quiet < 4 && t < Farthest; t += step)
        {
            var value = share(t);
            sum += value;
            quiet = Math.Abs(value) <= Negligible * scale ? quiet + 1 : 0;
        }

        return sum;
    }
}
