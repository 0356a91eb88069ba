using Auditor.Numerics.Factor;

namespace Auditor.Numerics;

/// <summary>Powers of one number, for columns that the tool forms itself.</summary>
/// <remarks>
/// Whole exponents up to 64 by repeated multiplication in double-double, rounded once: the nearest double but for rare ties
/// (checked against exact integer arithmetic), where the platform's own function may miss by one unit in the last place. That unit decides how many digits of a
/// high-degree polynomial fit can be had. Other exponents, and results near the ends of the range, by the platform's function.
/// </remarks>
public static class Powers
{
    private const int MostFactors = 64;
    private const double Smallest = 1e-280;

    /// <summary>x to the power, NaN when there is no real value.</summary>
    public static double Of(double x, double exponent) =>
        exponent == Math.Truncate(exponent) && Math.Abs(exponent) is >= 1 and <= MostFactors ? Whole(x, (int)exponent) : Math.Pow(x, exponent);

    /// <summary>What rounding took off <see cref="Of"/>, for whole exponents of 2 and more; 0 for others.</summary>
    public static double LowOf(double x, double exponent)
    {
        if (exponent != Math.Truncate(exponent) || exponent is < 2 or > MostFactors)
        {
            return 0;
        }

        var power = Multiplied(x, (int)exponent);
        return Math.Abs(power.High) is > Smallest and < 1 / Smallest ? power.Low : 0;
    }

    private static DoubleDouble Multiplied(double x, int factors)
    {
        var power = DoubleDouble.Of(x);
        for (var i = 1; i < factors; i++)
        {
            power *= x;
        }

        return power;
    }

    private static double Whole(double x, int exponent)
    {
        var power = Multiplied(x, Math.Abs(exponent));
        var value = exponent > 0 ? power.Value : Inverse(power);
        var inRange = Math.Abs(value) is > Smallest and < 1 / Smallest && Math.Abs(power.High) is > Smallest and < 1 / Smallest;
        return inRange ? value : Math.Pow(x, exponent);
    }

    /// <summary>The quotient of the leading parts with its remainder carried, rounded once.</summary>
    private static double Inverse(DoubleDouble value)
    {
        var quotient = 1 / value.High;
        var remainder = Math.FusedMultiplyAdd(-quotient, value.High, 1) - (quotient * value.Low);
        return quotient + (remainder / value.High);
    }
}
