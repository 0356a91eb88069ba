using System.Numerics;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Tests.Factor;

/// <summary>A whole number times a power of two: sums and products of doubles without rounding, for checks.</summary>
internal readonly record struct Dyadic(BigInteger Mantissa, int Twos)
{
    /// <summary>log2 of the size, near enough to state an error in bits; minus infinity for 0.</summary>
    public double Bits => Mantissa.IsZero ? double.NegativeInfinity : BigInteger.Log(BigInteger.Abs(Mantissa), 2) + Twos;

    public static Dyadic operator +(Dyadic a, Dyadic b)
    {
        var twos = Math.Min(a.Twos, b.Twos);
        return new Dyadic((a.Mantissa << (a.Twos - twos)) + (b.Mantissa << (b.Twos - twos)), twos);
    }

    public static Dyadic operator -(Dyadic a) => a with { Mantissa = -a.Mantissa };

    public static Dyadic operator -(Dyadic a, Dyadic b) => a + -b;

    public static Dyadic operator *(Dyadic a, Dyadic b) => new(a.Mantissa * b.Mantissa, a.Twos + b.Twos);

    public static Dyadic Of(double value)
    {
        var bits = BitConverter.DoubleToInt64Bits(value);
        var (exponent, mantissa) = ((int)((bits >> 52) & 0x7FF), bits & ((1L << 52) - 1));
        mantissa |= exponent > 0 ? 1L << 52 : 0;
        return new Dyadic(bits < 0 ? -mantissa : mantissa, Math.Max(1, exponent) - 1075);
    }

    public static Dyadic Of(DoubleDouble value) => Of(value.High) + Of(value.Low);

    public static Dyadic Power(double value, int exponent) =>
        Enumerable.Repeat(Of(value), exponent).Aggregate(Of(1.0), (product, factor) => product * factor);

    /// <summary>Sum of products.</summary>
    public static Dyadic Dot(IEnumerable<Dyadic> a, IEnumerable<Dyadic> b) =>
        a.Zip(b, (left, right) => left * right).Aggregate(new Dyadic(0, 0), (sum, product) => sum + product);

    public static Dyadic[] Exact(ReadOnlySpan<DoubleDouble> values)
    {
        var exact = new Dyadic[values.Length];
        for (var i = 0; i < exact.Length; i++)
        {
            exact[i] = Of(values[i]);
        }

        return exact;
    }

    /// <summary>Asserts that the two are equal or differ by less than 2^-bits of the given size.</summary>
    public static void Near(Dyadic expected, Dyadic actual, double sizeBits, double bits)
    {
        var error = (expected - actual).Bits;
        Assert.True(double.IsNegativeInfinity(error) || error < sizeBits - bits, $"off by 2^{error - sizeBits:F1} of the size, allowed 2^-{bits}");
    }
}
