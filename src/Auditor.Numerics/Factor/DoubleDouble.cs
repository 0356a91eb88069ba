namespace Auditor.Numerics.Factor;

/// <summary>An unevaluated sum of two doubles, about 31 decimal digits.</summary>
/// <remarks>Dekker 1971; Knuth, The Art of Computer Programming 2, 4.2.2 (two-sum); products by fused multiply-add.</remarks>
internal readonly record struct DoubleDouble(double High, double Low)
{
    public double Value => High + Low;

    public static DoubleDouble operator +(DoubleDouble a, DoubleDouble b)
    {
        var sum = a.High + b.High;
        var part = sum - a.High;
        var error = (a.High - (sum - part)) + (b.High - part) + a.Low + b.Low;
        return Renormalise(sum, error);
    }

    public static DoubleDouble operator -(DoubleDouble a) => new(-a.High, -a.Low);

    public static DoubleDouble operator -(DoubleDouble a, DoubleDouble b) => a + -b;

    public static DoubleDouble operator *(DoubleDouble a, double b)
    {
        var product = a.High * b;
        return Renormalise(product, Math.FusedMultiplyAdd(a.High, b, -product) + (a.Low * b));
    }

    public static DoubleDouble operator *(DoubleDouble a, DoubleDouble b)
    {
        var product = a.High * b.High;
        return Renormalise(product, Math.FusedMultiplyAdd(a.High, b.High, -product) + ((a.High * b.Low) + (a.Low * b.High)));
    }

    public static DoubleDouble operator /(DoubleDouble a, DoubleDouble b)
    {
        var first = a.High / b.High;
        var rest = a - (b * first);
        var second = rest.High / b.High;
        return Renormalise(first, second) + Of((rest - (b * second)).High / b.High);
    }

    /// <summary>The square root of a positive number: one Newton step from the root of the high part.</summary>
    public static DoubleDouble Sqrt(DoubleDouble a)
    {
        var root = Math.Sqrt(a.High);
        return root == 0 ? Of(0) : Renormalise(root, (a - (Of(root) * root)).High / (2 * root));
    }

    public static DoubleDouble Of(double value) => new(value, 0);

    private static DoubleDouble Renormalise(double high, double low)
    {
        var sum = high + low;
        return new DoubleDouble(sum, low - (sum - high));
    }
}
