using System.Numerics;

namespace Auditor.Numerics.Tests;

public sealed class PowersTests
{
    private static readonly double[] _values = [0.1, -0.3, 1 / 3.0, Math.PI, -7.0000001, 1.0000000000000002, 8.781464495, 93.7, 123456.789];

    public static TheoryData<int> Exponents => [2, 3, 5, 7, 10, 13, 20, 31];

    /// <summary>Source: the exact power of the double, by whole-number arithmetic (System.Numerics.BigInteger), rounded to nearest even.</summary>
    [Theory]
    [MemberData(nameof(Exponents))]
    public void Whole_powers_are_the_nearest_double(int exponent) =>
        Assert.All(_values, x => Assert.Equal(Exact(x, exponent), Powers.Of(x, exponent)));

    /// <summary>Source: as above, the exact quotient one by the power.</summary>
    [Theory]
    [MemberData(nameof(Exponents))]
    public void Negative_whole_powers_are_the_nearest_double(int exponent) =>
        Assert.All(_values, x => Assert.Equal(Exact(x, -exponent), Powers.Of(x, -exponent)));

    /// <summary>Source: the exact power by whole-number arithmetic; value and low part together miss it by less than 2^-98 of its size.</summary>
    [Theory]
    [MemberData(nameof(Exponents))]
    public void Low_parts_are_what_rounding_took_off(int exponent) => Assert.All(_values, x =>
    {
        var exact = Factor.Dyadic.Power(x, exponent);
        var (value, low) = (Powers.Of(x, exponent), Powers.LowOf(x, exponent));
        Factor.Dyadic.Near(exact, Factor.Dyadic.Of(value) + Factor.Dyadic.Of(low), exact.Bits, 98);
    });

    [Theory]
    [InlineData(3, 1)]
    [InlineData(3, 2.5)]
    [InlineData(3, -2)]
    [InlineData(3, 100)]
    [InlineData(1e200, 2)]
    public void No_low_part_where_none_is_known(double x, double exponent) => Assert.Equal(0, Powers.LowOf(x, exponent));

    /// <summary>Source: definition, and IEEE 754-2019 section 9.2.1 (pow) for the ends of the range.</summary>
    [Theory]
    [InlineData(7, 1, 7)]
    [InlineData(0, 3, 0)]
    [InlineData(0, -1, double.PositiveInfinity)]
    [InlineData(-8, 1.5, double.NaN)]
    [InlineData(2, 0.5, 1.4142135623730951)]
    [InlineData(1e200, 2, double.PositiveInfinity)]
    [InlineData(1e-200, 2, 0)]
    [InlineData(1e-200, -2, double.PositiveInfinity)]
    [InlineData(2, 100, 1267650600228229401496703205376d)]
    [InlineData(1.3552527156068805e-20, 15, 9.556619453472961e-299)] // powers of two
    public void Other_exponents_and_the_ends_of_the_range(double x, double exponent, double expected) =>
        Assert.Equal(expected, Powers.Of(x, exponent));

    private static double Exact(double x, int exponent)
    {
        var (mantissa, scale) = Parts(x);
        var power = BigInteger.Pow(BigInteger.Abs(mantissa), Math.Abs(exponent));
        var twos = scale * Math.Abs(exponent);
        var (above, below) = exponent > 0 ? (power, BigInteger.One) : (BigInteger.One, power);
        var size = Nearest(above, below, exponent > 0 ? twos : -twos);
        return mantissa.Sign < 0 && exponent % 2 != 0 ? -size : size;
    }

    /// <summary>x as a whole number times a power of two.</summary>
    private static (BigInteger Mantissa, int Scale) Parts(double x)
    {
        var bits = BitConverter.DoubleToInt64Bits(x);
        var mantissa = (bits & ((1L << 52) - 1)) | (1L << 52);
        return (bits < 0 ? -mantissa : mantissa, (int)((bits >> 52) & 0x7FF) - 1075);
    }

    /// <summary>The double nearest to above / below * 2^twos, half to even; in the normal range.</summary>
    private static double Nearest(BigInteger above, BigInteger below, int twos)
    {
        var shift = 54 + (int)(below.GetBitLength() - above.GetBitLength());
        var (numerator, denominator) = shift >= 0 ? (above << shift, below) : (above, below << -shift);
        var digits = BigInteger.DivRem(numerator, denominator, out var rest);
        var surplus = (int)digits.GetBitLength() - 53;
        var dropped = digits & ((BigInteger.One << surplus) - 1);
        var half = BigInteger.One << (surplus - 1);
        var kept = digits >> surplus;
        var up = dropped > half || (dropped == half && (!rest.IsZero || !kept.IsEven));
        return Math.ScaleB((double)(kept + (up ? 1 : 0)), twos - shift + surplus);
    }
}
