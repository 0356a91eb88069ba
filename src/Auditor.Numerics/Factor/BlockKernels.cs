using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace Auditor.Numerics.Factor;

/// <summary>
/// Inner loops over contiguous columns. Eight logical lanes whatever the processor (it may carry them out in halves or one by one), so the
/// same input gives the same bits on every machine; lanes are summed in a fixed order.
/// </summary>
internal static class BlockKernels
{
    private const int Lanes = 8;

    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        ref var left = ref MemoryMarshal.GetReference(a);
        ref var right = ref MemoryMarshal.GetReference(b);
        var sum = Vector512<double>.Zero;
        nuint i = 0;
        var whole = (nuint)(a.Length - (a.Length % Lanes));
        for (; i < whole; i += Lanes)
        {
            sum = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref left, i), Vector512.LoadUnsafe(ref right, i), sum);
        }

        var total = SumLanes(sum);
        for (var j = (int)i; j < a.Length; j++)
        {
            total = Math.FusedMultiplyAdd(a[j], b[j], total);
        }

        return total;
    }

    /// <summary>into += factor * column.</summary>
    public static void AddScaled(Span<double> into, double factor, ReadOnlySpan<double> column)
    {
        ref var target = ref MemoryMarshal.GetReference(into);
        ref var source = ref MemoryMarshal.GetReference(column);
        var scale = Vector512.Create(factor);
        nuint i = 0;
        var whole = (nuint)(into.Length - (into.Length % Lanes));
        for (; i < whole; i += Lanes)
        {
            Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref source, i), scale, Vector512.LoadUnsafe(ref target, i))
                .StoreUnsafe(ref target, i);
        }

        for (var j = (int)i; j < into.Length; j++)
        {
            into[j] = Math.FusedMultiplyAdd(column[j], factor, into[j]);
        }
    }

    public static void Scale(Span<double> column, double factor)
    {
        foreach (ref var value in column)
        {
            value *= factor;
        }
    }

    /// <summary>into[i] += column[i]².</summary>
    public static void AddSquares(Span<double> into, ReadOnlySpan<double> column)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] = Math.FusedMultiplyAdd(column[i], column[i], into[i]);
        }
    }

    /// <summary>into[i] = a[i] * b[i].</summary>
    public static void Multiply(ReadOnlySpan<double> a, ReadOnlySpan<double> b, Span<double> into)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] = a[i] * b[i];
        }
    }

    private static double SumLanes(Vector512<double> lanes)
    {
        var four = lanes.GetLower() + lanes.GetUpper();
        var two = four.GetLower() + four.GetUpper();
        return two[0] + two[1];
    }
}
