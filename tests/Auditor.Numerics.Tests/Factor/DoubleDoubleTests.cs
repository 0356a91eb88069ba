using Auditor.Numerics.Factor;
using CsCheck;

namespace Auditor.Numerics.Tests.Factor;

/// <summary>Source: the same operations on whole numbers (System.Numerics.BigInteger), without rounding. A double-double carries 104 bits or more.</summary>
public sealed class DoubleDoubleTests
{
    private const double Bits = 100;

    private static Gen<DoubleDouble> Number =>
        from high in Gen.Double[-1e3, 1e3]
        from low in Gen.Double[-1, 1]
        from scale in Gen.Int[-40, 40]
        select DoubleDouble.Of(Math.ScaleB(high, scale)) + DoubleDouble.Of(Math.ScaleB(low, scale - 50));

    private static Gen<DoubleDouble[]> Numbers => Number.Array[1, 60];

    [Fact]
    public void Sum_and_product_keep_a_hundred_bits() => Gen.Select(Number, Number).Sample((a, b) =>
    {
        var (x, y) = (Dyadic.Of(a), Dyadic.Of(b));
        Dyadic.Near(x + y, Dyadic.Of(a + b), Math.Max(x.Bits, y.Bits), Bits);
        Dyadic.Near(x * y, Dyadic.Of(a * b), (x * y).Bits, Bits);
        Dyadic.Near(x * Dyadic.Of(b.High), Dyadic.Of(a * b.High), (x * y).Bits, Bits);
    });

    /// <summary>The quotient times the divisor, and the root times itself, give the number back.</summary>
    [Fact]
    public void Quotient_and_root_keep_a_hundred_bits() => Gen.Select(Number, Number).Where((_, b) => b.High != 0).Sample((a, b) =>
    {
        Dyadic.Near(Dyadic.Of(a), Dyadic.Of(a / b) * Dyadic.Of(b), Dyadic.Of(a).Bits, Bits);
        var positive = a.High < 0 ? -a : a;
        var root = Dyadic.Of(DoubleDouble.Sqrt(positive));
        Dyadic.Near(Dyadic.Of(positive), root * root, Dyadic.Of(positive).Bits, Bits);
    });

    [Fact]
    public void Sum_of_products_of_a_column_keeps_ninety_bits_of_its_terms() => Gen.Select(Numbers, Gen.Double[-1e3, 1e3].Array[60]).Sample((column, values) =>
    {
        double[] high = [.. column.Select(value => value.High)];
        double[] low = [.. column.Select(value => value.Low)];
        var others = values[..column.Length];
        Dyadic[] exact = [.. others.Select(Dyadic.Of)];
        var size = column.Zip(exact, (a, b) => (Dyadic.Of(a) * b).Bits).Max();
        Dyadic.Near(Dyadic.Dot(Dyadic.Exact(column), exact), Dyadic.Of(DoubleDoubleKernels.Dot(high, low, others)), size, 90);
        Dyadic.Near(Dyadic.Exact(column).Aggregate((a, b) => a + b), Dyadic.Of(DoubleDoubleKernels.Sum(high, low)), column.Max(value => Dyadic.Of(value).Bits), 90);
    });

    [Fact]
    public void A_scaled_column_is_taken_off_with_ninety_bits() => Gen.Select(Numbers, Gen.Double[-1e3, 1e3].Array[60], Number).Sample((column, values, factor) =>
    {
        double[] high = [.. column.Select(value => value.High)];
        double[] low = [.. column.Select(value => value.Low)];
        DoubleDoubleKernels.SubtractScaled(high, low, values.AsSpan(0, column.Length), factor);
        DoubleDoubleKernels.Renormalise(high, low);
        for (var i = 0; i < column.Length; i++)
        {
            var (old, product) = (Dyadic.Of(column[i]), Dyadic.Of(values[i]) * Dyadic.Of(factor));
            Dyadic.Near(old - product, Dyadic.Of(new DoubleDouble(high[i], low[i])), Math.Max(old.Bits, product.Bits), 90);
            Assert.True(Math.Abs(low[i]) <= Math.BitIncrement(Math.Abs(high[i])) - Math.Abs(high[i]));
        }
    });
}
