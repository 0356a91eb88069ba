using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace Auditor.Numerics.Factor;

/// <summary>Inner loops over columns of double-doubles; lanes as in <see cref="BlockKernels"/>.</summary>
internal static class DoubleDoubleKernels
{
    private const int Lanes = 8;

    /// <summary>(high, low) -= column * factor, row by row.</summary>
    public static void SubtractScaled(Span<double> high, Span<double> low, ReadOnlySpan<double> column, DoubleDouble factor)
    {
        ref var h = ref MemoryMarshal.GetReference(high);
        ref var l = ref MemoryMarshal.GetReference(low);
        ref var x = ref MemoryMarshal.GetReference(column);
        var (bHigh, bLow) = (Vector512.Create(factor.High), Vector512.Create(factor.Low));
        nuint i = 0;
        for (; i + Lanes <= (nuint)high.Length; i += Lanes)
        {
            var value = Vector512.LoadUnsafe(ref x, i);
            var old = Vector512.LoadUnsafe(ref h, i);
            var product = value * bHigh;
            var productError = Vector512.FusedMultiplyAdd(value, bHigh, -product);
            var difference = old - product;
            var part = difference - old;
            var error = old - (difference - part) - (product + part);
            difference.StoreUnsafe(ref h, i);
            (Vector512.LoadUnsafe(ref l, i) + (error - productError - (value * bLow))).StoreUnsafe(ref l, i);
        }

        for (var j = (int)i; j < high.Length; j++)
        {
            var product = column[j] * factor.High;
            var productError = Math.FusedMultiplyAdd(column[j], factor.High, -product);
            var difference = high[j] - product;
            var part = difference - high[j];
            low[j] += high[j] - (difference - part) - (product + part) - productError - (column[j] * factor.Low);
            high[j] = difference;
        }
    }

    /// <summary>Makes every low part smaller than half the last place of its high part.</summary>
    public static void Renormalise(Span<double> high, Span<double> low)
    {
        ref var h = ref MemoryMarshal.GetReference(high);
        ref var l = ref MemoryMarshal.GetReference(low);
        nuint i = 0;
        for (; i + Lanes <= (nuint)high.Length; i += Lanes)
        {
            var (old, rest) = (Vector512.LoadUnsafe(ref h, i), Vector512.LoadUnsafe(ref l, i));
            var sum = old + rest;
            sum.StoreUnsafe(ref h, i);
            (rest - (sum - old)).StoreUnsafe(ref l, i);
        }

        for (var j = (int)i; j < high.Length; j++)
        {
            var sum = high[j] + low[j];
            (high[j], low[j]) = (sum, low[j] - (sum - high[j]));
        }
    }

    /// <summary>Sum of the double-doubles.</summary>
    public static DoubleDouble Sum(ReadOnlySpan<double> high, ReadOnlySpan<double> low)
    {
        ref var h = ref MemoryMarshal.GetReference(high);
        ref var l = ref MemoryMarshal.GetReference(low);
        Vector512<double> sum = default, error = default;
        nuint i = 0;
        for (; i + Lanes <= (nuint)high.Length; i += Lanes)
        {
            (sum, error) = Add(sum, error, Vector512.LoadUnsafe(ref h, i), Vector512.LoadUnsafe(ref l, i));
        }

        var total = SumLanes(sum, error);
        for (var j = (int)i; j < high.Length; j++)
        {
            total += new DoubleDouble(high[j], low[j]);
        }

        return total;
    }

    /// <summary>Sum of double-double times double; products of the high parts are exact, sums carry their errors along (Ogita, Rump and Oishi 2005, from memory).</summary>
    public static DoubleDouble Dot(ReadOnlySpan<double> high, ReadOnlySpan<double> low, ReadOnlySpan<double> values)
    {
        ref var h = ref MemoryMarshal.GetReference(high);
        ref var l = ref MemoryMarshal.GetReference(low);
        ref var x = ref MemoryMarshal.GetReference(values);
        Vector512<double> sum = default, error = default;
        nuint i = 0;
        for (; i + Lanes <= (nuint)high.Length; i += Lanes)
        {
            var (head, value) = (Vector512.LoadUnsafe(ref h, i), Vector512.LoadUnsafe(ref x, i));
            var product = head * value;
            var rest = Vector512.FusedMultiplyAdd(head, value, -product);
            (sum, error) = Add(sum, error, product, Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref l, i), value, rest));
        }

        var total = SumLanes(sum, error);
        for (var j = (int)i; j < high.Length; j++)
        {
            total += new DoubleDouble(high[j], low[j]) * values[j];
        }

        return total;
    }

    private static (Vector512<double> Sum, Vector512<double> Error) Add(
        Vector512<double> sum, Vector512<double> error, Vector512<double> value, Vector512<double> rest)
    {
        var next = sum + value;
        var part = next - sum;
        return (next, error + ((sum - (next - part)) + (value - part) + rest));
    }

    private static DoubleDouble SumLanes(Vector512<double> sum, Vector512<double> error)
    {
        var total = DoubleDouble.Of(0);
        for (var lane = 0; lane < Lanes; lane++)
        {
            total += DoubleDouble.Of(sum[lane]) + DoubleDouble.Of(error[lane]);
        }

        return total;
    }
}
