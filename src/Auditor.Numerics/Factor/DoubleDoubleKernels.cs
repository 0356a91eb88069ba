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
}
