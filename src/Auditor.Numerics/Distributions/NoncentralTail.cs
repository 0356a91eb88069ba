namespace Auditor.Numerics.Distributions;

/// <summary>
/// One tail of the noncentral F distribution and its slope in lambda, as the Poisson mixture of central tails
/// sum over j of w_j T_j, w_j = Poisson(j; lambda/2), T_j the tail of the beta distribution with parameters a + j and b.
/// </summary>
/// <remarks>
/// The terms w_j T_j rise to one mode and fall again. They are summed across that mode only, from the side on which the recurrence between
/// neighbouring T adds and never subtracts: downwards for the lower tail, upwards for the upper. Terms are carried as products w_j T_j on a
/// common scale, so nothing under- or overflows however small the tail. The first term comes from <see cref="BetaTail"/>. The slope follows
/// from T_{j+1} - T_j = ∓ G_j, G_j = x^(a+j) (1-x)^b / ((a+j) B(a+j, b)).
/// Above <see cref="StridedFrom"/> the terms change so slowly that every (sqrt(mode)/4)-th of them, times the stride, gives the sum
/// (trapezoid rule on a smooth peak; its error is below exp(-100)); above <see cref="FixedFrom"/> the Poisson law is a point.
/// </remarks>
internal readonly struct NoncentralTail
{
    private const double StridedFrom = 2e6;
    private const double FixedFrom = 1e25;

    // Some 40 strides reach across a peak; more are met only where the tail is 0 in any case and the mode has no more digits than the stride.
    private const int MostStrides = 1000;
    private const double Negligible = PeakSum.Negligible;

    private readonly double _f;
    private readonly double _a;
    private readonly double _b;
    private readonly double _mu;
    private readonly bool _upper;
    private readonly double _t; // 1/b
    private readonly double _x;
    private readonly double _scaled; // b x

    private NoncentralTail(double f, double df1, double df2, double lambda, bool upper)
    {
        _f = f;
        _a = df1 / 2;
        _b = df2 / 2;
        _mu = lambda / 2;
        _upper = upper;
        _t = 1 / _b;
        double odds = _a * _t * f;
        _x = odds < 1 ? odds / (1 + odds) : 1 / (1 + (1 / odds));
        _scaled = _t * f < 1 ? _a * f / (1 + odds) : 1 / (_t + (1 / (_a * f)));
    }

    /// <summary>log of the tail, and minus (lower) or plus (upper) its derivative in lambda over the tail itself: both non-negative.</summary>
    public static (double LogTail, double Rate) At(double f, double df1, double df2, double lambda, bool upper)
    {
        var tail = new NoncentralTail(f, df1, df2, lambda, upper);
        return tail._mu > FixedFrom ? tail.Fixed() : tail.Mode() > StridedFrom ? tail.Strided() : upper ? tail.SumUpwards() : tail.SumDownwards();
    }

    /// <summary>(log w_j T_j, log w_j G_j)</summary>
    private (double LogTerm, double LogStep) Term(double j, double fromMean)
    {
        (double logTail, double logStep) = Central(j);
        double logWeight = LogWeight(j, fromMean);
        return (logWeight + logTail, logWeight + logStep);
    }

    private (double LogTail, double LogStep) Central(double j)
    {
        double shape = _a + j;
        BetaTail tail = BetaTail.At(_f * (_a / shape), shape, _b);
        return (_upper ? tail.LogUpper : tail.LogLower, tail.LogDensity - Math.Log(shape));
    }

    /// <summary>log of the Poisson probability of j (real, at least 0), by Loader's form; fromMean = j - mean.</summary>
    private double LogWeight(double j, double fromMean)
    {
        if (j == 0)
        {
            return -_mu;
        }

        double deviance = Math.Abs(fromMean) < 0.5 * j
            ? j * Deviance.Excess(-fromMean / j)
            : (j * Math.Log(j / _mu)) - fromMean;
        return -Deviance.StirlingError(j) - (0.5 * Math.Log(2 * Math.PI * j)) - deviance;
    }

    /// <summary>T_{j+1}/T_j would be this if the tail were all in its last step: G_{j+1}/G_j.</summary>
    private double StepRatio(double j) => _scaled * (1 + ((_a + j) * _t)) / (_a + j + 1);

    /// <summary>About where w_j T_j is largest: the mode of w_j or that of w_j G_j, whichever comes first from the side of the sum.</summary>
    private double Mode()
    {
        // w_j G_j is largest where mu (b x)(1 + (a+j)/b) = (j+1)(a+j+1): the larger root of j² + p j + q.
        double p = _a + 2 - (_mu * _x);
        double q = _a + 1 - (_mu * _scaled * (1 + (_a * _t)));
        double root = Math.Sqrt(Math.Max(0, (p * p) - (4 * q)));
        double steps = q >= 0 && p >= 0 ? 0 : Math.Max(0, p > 0 ? -2 * q / (p + root) : (root - p) / 2);
        return _upper ? Math.Max(_mu, steps) : Math.Min(_mu, steps);
    }

    private (double LogTail, double Rate) SumDownwards()
    {
        // T_{j+1}/T_j is at most 1 and at most the larger of the step ratio and its limit x.
        double j = Math.Floor(Mode());
        for (double bound = 1; bound > Negligible; j++)
        {
            bound *= _mu / (j + 1) * Math.Min(1, Math.Max(StepRatio(j), _x));
        }

        var sum = new PeakSum(Term(j, j - _mu));
        bool counts = true;
        while (counts && j > 0)
        {
            j--;
            double ratio = (j + 1) / _mu;
            double step = sum.Step * ratio / StepRatio(j);
            counts = sum.Add((sum.Term * ratio) + step, step);
        }

        return sum.Result;
    }

    private (double LogTail, double Rate) SumUpwards()
    {
        // T_{j-1}/T_j is at most 1 and, for b above 1, about G_{j-1}/G_j or less; too early a start costs time only.
        double j = Math.Ceiling(Mode());
        for (double bound = 1; bound > Negligible && j > 0; j--)
        {
            bound *= j / _mu * (_b > 1 ? Math.Min(1, 1 / StepRatio(j - 1)) : 1);
        }

        var sum = new PeakSum(Term(j, j - _mu));
        bool counts = true;
        while (counts)
        {
            double ratio = _mu / (j + 1);
            counts = sum.Add((sum.Term + sum.Step) * ratio, sum.Step * ratio * StepRatio(j));
            j++;
        }

        return sum.Result;
    }

    private (double LogTail, double Rate) Strided()
    {
        double mode = Mode();
        double stride = Math.Sqrt(mode) / 4;
        var sum = new PeakSum(Term(mode, mode - _mu));
        foreach (double move in (ReadOnlySpan<double>)[-stride, stride])
        {
            sum.BackToFirst();
            bool counts = true;
            for (int k = 1; counts && k < MostStrides && mode + (k * move) > 0; k++)
            {
                (double logTerm, double logStep) = Term(mode + (k * move), mode - _mu + (k * move));
                counts = sum.Add(Math.Exp(logTerm - sum.Scale), Math.Exp(logStep - sum.Scale));
            }
        }

        (double logTail, double rate) = sum.Result;
        return (logTail + Math.Log(stride), rate);
    }

    private (double LogTail, double Rate) Fixed()
    {
        (double logTail, double logStep) = Central(_mu);
        return (logTail, Math.Exp(logStep - logTail) / 2);
    }
}
