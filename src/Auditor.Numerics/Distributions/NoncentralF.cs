namespace Auditor.Numerics.Distributions;

/// <summary>
/// The noncentral F distribution: (noncentral chi-squared(df1, lambda)/df1) over (chi-squared(df2)/df2), lambda the sum of squared means
/// (so that the mean of the numerator is 1 + lambda/df1).
/// </summary>
/// <remarks>
/// Arguments: f in [0, +inf]; real df1 above 0, finite; df2 above 0 (+inf: noncentral chi-squared over df1; above 1e30 it is
/// taken as that); lambda at least 0, finite.
/// Source: the Poisson mixture of central beta tails (Johnson, Kotz and Balakrishnan 1995, chapter 30, from memory), summed as
/// <see cref="NoncentralTail"/> says. Work is bounded: about 20 sqrt(lambda) additions up to lambda of 4e6, fewer than a hundred central tails above.
/// Verified to 1e-10 relative against 80-digit values (plain mixture; for even df2 a finite Laguerre sum with no mixture in it) for df1 from 0.5 to
/// 3000, df2 from 0.7 to 3e8, lambda from 3e-9 to 3e7 (mixture) and 1e30 (Laguerre), both tails down to 1e-230; the inverses for lambda from 1e-3 to 3e7
/// where the probability asked for differs from the central one by at least a thousandth of itself.
/// Limits of a double: lambda and f are held to 1e-16, which above a lambda of about 1e8 alone moves a very small probability by more than 1e-10.
/// </remarks>
public static class NoncentralF
{
    private const int MostSteps = 300;
    private const double LargestLambda = 1e300;
    private const double LargestDf2 = 1e30;
    private const double Vanishing = 1e-290;

    /// <summary>A relative Newton step whose square, the error that is left after it, no longer counts.</summary>
    private const double Settled = 1e-10;

    /// <summary>P(F' &lt;= f), with full relative accuracy where it is small.</summary>
    public static double Cumulative(double f, double df1, double df2, double lambda) => Tail(f, df1, df2, lambda, upper: false);

    /// <summary>P(F' > f), the power of an F test with critical value f, with full relative accuracy where it is small.</summary>
    public static double Survival(double f, double df1, double df2, double lambda) => Tail(f, df1, df2, lambda, upper: true);

    /// <summary>
    /// A confidence limit of the noncentrality: lambda at least 0 with P(F' &lt;= f) = cumulative, which falls as lambda grows.
    /// 0 when the central probability is already at most the one asked for; null when f is +inf or no finite lambda reaches it.
    /// </summary>
    /// <remarks>
    /// Newton's method on the logarithm of the smaller tail. Close to lambda = 0 the answer is a difference of nearly equal probabilities:
    /// its absolute error is then about 1e-14 over the slope there, whatever the method.
    /// </remarks>
    public static double? Noncentrality(double f, double df1, double df2, double cumulative)
    {
        FisherF.CheckProbability(cumulative);
        f = Checked(f, df1, df2, 0);
        if (double.IsInfinity(f))
        {
            return null;
        }

        if (cumulative == 1 || f == 0)
        {
            return 0;
        }

        return cumulative <= 0.5
            ? Solve(f, df1, df2, cumulative, upper: false)
            : Solve(f, df1, df2, 1 - cumulative, upper: true);
    }

    /// <summary>
    /// The noncentrality at which an F test with this critical value has this power: lambda with P(F' > criticalF) = power.
    /// 0 when the test rejects at least so often under the null; null when criticalF is +inf or the power is 1 (unless criticalF is 0).
    /// </summary>
    /// <remarks>As <see cref="Noncentrality"/>, with the power itself as the target, so that a small one keeps its digits.</remarks>
    public static double? NoncentralityForPower(double criticalF, double df1, double df2, double power)
    {
        FisherF.CheckProbability(power);
        criticalF = Checked(criticalF, df1, df2, 0);
        if (double.IsInfinity(criticalF))
        {
            return null;
        }

        if (power == 0 || criticalF == 0)
        {
            return 0;
        }

        return power <= 0.5
            ? Solve(criticalF, df1, df2, power, upper: true)
            : Solve(criticalF, df1, df2, 1 - power, upper: false);
    }

    private static double Tail(double f, double df1, double df2, double lambda, bool upper)
    {
        f = Checked(f, df1, df2, lambda);
        if (lambda < Vanishing)
        {
            return upper ? FisherF.Survival(f, df1, df2) : FisherF.Cumulative(f, df1, df2);
        }

        return f == 0 || double.IsInfinity(f)
            ? (f == 0) == upper ? 1 : 0
            : Math.Min(1, Math.Exp(NoncentralTail.At(f, df1, Math.Min(df2, LargestDf2), lambda, upper).LogTail));
    }

    private static double Checked(double f, double df1, double df2, double lambda)
    {
        if (double.IsInfinity(df1))
        {
            throw new ArgumentOutOfRangeException(nameof(df1), "The numerator degrees of freedom of a noncentral F are finite.");
        }

        if (!(lambda >= 0 && double.IsFinite(lambda)))
        {
            throw new ArgumentOutOfRangeException(nameof(lambda), "A noncentrality is finite and at least 0.");
        }

        return FisherF.Checked(f, df1, df2);
    }

    /// <summary>lambda at which this tail has this probability; the lower tail falls and the upper tail grows with lambda.</summary>
    private static double? Solve(double f, double df1, double df2, double probability, bool upper)
    {
        double central = upper ? FisherF.Survival(f, df1, df2) : FisherF.Cumulative(f, df1, df2);
        if (upper ? central >= probability : central <= probability)
        {
            return 0;
        }

        if (probability == 0)
        {
            return null;
        }

        double target = Math.Log(probability);
        double low = 0;
        double high = double.PositiveInfinity;
        double root = Math.Sqrt(Math.Max(df1 * (f - 1), 1)); // of lambda: the tails are nearly normal in it
        for (int step = 0; step < MostSteps && root * root < LargestLambda; step++)
        {
            (double logTail, double rate) = NoncentralTail.At(f, df1, Math.Min(df2, LargestDf2), root * root, upper);
            double missing = upper ? target - logTail : logTail - target; // above 0: lambda must grow
            (low, high) = missing > 0 ? (root, high) : (low, root);
            double move = missing / (2 * root * rate);
            if (Math.Abs(move) <= Settled * root)
            {
                return (root + move) * (root + move);
            }

            double next = Next(root, move, low, high);
            if (next == root)
            {
                break;
            }

            root = next;
        }

        double lambda = root * root;
        return lambda < LargestLambda ? lambda : null;
    }

    /// <summary>The Newton step, at most doubling; halfway into the bracket where it would leave that.</summary>
    private static double Next(double root, double move, double low, double high)
    {
        double next = Math.Min(root + move, (2 * root) + 3);
        return next > low && next < high ? next : double.IsInfinity(high) ? (2 * root) + 3 : (low + high) / 2;
    }
}
