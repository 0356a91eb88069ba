using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Shapiro–Wilk check. Null: the errors are normal. W = (sum a_i x_(i))² / sum (x_i - mean)² of the n ordered residuals, 3 to 5,000; p by Royston's normal
/// approximation of a transform of 1 - W (exact for n = 3).
/// </summary>
/// <remarks>Royston 1995, Applied Statistics 44, algorithm AS R94. Verified against R's shapiro.test (tests/reference).</remarks>
public static class ShapiroWilk
{
    private const int Fewest = 3;
    private const int Most = 5000;

    private static readonly double[] C1 = [0, 0.221157, -0.147981, -2.07119, 4.434685, -2.706056];
    private static readonly double[] C2 = [0, 0.042981, -0.293762, -1.752461, 5.682633, -3.582633];
    private static readonly double[] SmallMean = [0.544, -0.39978, 0.025054, -6.714e-4];
    private static readonly double[] SmallLogSd = [1.3822, -0.77857, 0.062767, -0.0020322];
    private static readonly double[] LargeMean = [-1.5861, -0.31082, -0.083751, 0.0038915];
    private static readonly double[] LargeLogSd = [-0.4803, -0.082676, 0.0030302];
    private static readonly double[] SmallGamma = [-2.273, 0.459];

    public static CheckOutcome Of(CheckedFit fit) =>
        fit.ShapeImpediment(Fewest, Most) is { } impediment ? CheckOutcome.None(impediment) : Of(fit.Ordered);

    private static CheckStatistic Of(double[] ordered)
    {
        var a = Coefficients(ordered.Length);
        var mean = ordered.Average();
        var sum = 0.0;
        for (var i = 0; i < a.Length; i++)
        {
            sum += a[i] * (ordered[^(i + 1)] - ordered[i]);
        }

        var w = Math.Min(1, sum * sum / ordered.Sum(value => (value - mean) * (value - mean)));
        return new CheckStatistic(w, null, null, P(w, ordered.Length)) { Sizes = [new(SizeMeasure.NormalPlotRSquared, w)] };
    }

    /// <summary>The upper half of the coefficients a, largest first.</summary>
    private static double[] Coefficients(int n)
    {
        if (n == 3)
        {
            return [Math.Sqrt(0.5)];
        }

        var m = Enumerable.Range(1, n / 2).Select(i => -StandardNormal.Quantile((i - 0.375) / (n + 0.25))).ToArray();
        var squares = 2 * m.Sum(value => value * value);
        var root = 1 / Math.Sqrt(n);
        var first = Polynomial(C1, root) + (m[0] / Math.Sqrt(squares));
        if (n <= 5)
        {
            var factor = Math.Sqrt((squares - (2 * m[0] * m[0])) / (1 - (2 * first * first)));
            return [first, .. m.Skip(1).Select(value => value / factor)];
        }

        var second = Polynomial(C2, root) + (m[1] / Math.Sqrt(squares));
        var rest = Math.Sqrt((squares - (2 * m[0] * m[0]) - (2 * m[1] * m[1])) / (1 - (2 * first * first) - (2 * second * second)));
        return [first, second, .. m.Skip(2).Select(value => value / rest)];
    }

    private static double P(double w, int n)
    {
        if (n == 3)
        {
            return Math.Max(0, 6 / Math.PI * (Math.Asin(Math.Sqrt(w)) - Math.Asin(Math.Sqrt(0.75))));
        }

        var (y, log) = (Math.Log(1 - w), Math.Log(n));
        if (n > 11)
        {
            return StandardNormal.UpperTail((y - Polynomial(LargeMean, log)) / Math.Exp(Polynomial(LargeLogSd, log)));
        }

        var gamma = Polynomial(SmallGamma, n);
        return y >= gamma ? 1e-99 : StandardNormal.UpperTail((-Math.Log(gamma - y) - Polynomial(SmallMean, n)) / Math.Exp(Polynomial(SmallLogSd, n)));
    }

    private static double Polynomial(double[] coefficients, double x)
    {
        var value = 0.0;
        for (var i = coefficients.Length - 1; i >= 0; i--)
        {
            value = (value * x) + coefficients[i];
        }

        return value;
    }
}
