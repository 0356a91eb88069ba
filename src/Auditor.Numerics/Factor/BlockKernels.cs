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
        var whole = Whole(a.Length);
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
        var whole = Whole(into.Length);
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
        ref var target = ref MemoryMarshal.GetReference(column);
        var scale = Vector512.Create(factor);
        nuint i = 0;
        for (; i < Whole(column.Length); i += Lanes)
        {
            (Vector512.LoadUnsafe(ref target, i) * scale).StoreUnsafe(ref target, i);
        }

        foreach (ref var value in column[(int)i..])
        {
            value *= factor;
        }
    }

    /// <summary>into[i] += column[i]².</summary>
    public static void AddSquares(Span<double> into, ReadOnlySpan<double> column)
    {
        ref var target = ref MemoryMarshal.GetReference(into);
        ref var source = ref MemoryMarshal.GetReference(column);
        nuint i = 0;
        for (; i < Whole(into.Length); i += Lanes)
        {
            var value = Vector512.LoadUnsafe(ref source, i);
            Vector512.FusedMultiplyAdd(value, value, Vector512.LoadUnsafe(ref target, i)).StoreUnsafe(ref target, i);
        }

        for (var j = (int)i; j < into.Length; j++)
        {
            into[j] = Math.FusedMultiplyAdd(column[j], column[j], into[j]);
        }
    }

    /// <summary>into[i] = a[i] * b[i].</summary>
    public static void Multiply(ReadOnlySpan<double> a, ReadOnlySpan<double> b, Span<double> into)
    {
        ref var target = ref MemoryMarshal.GetReference(into);
        ref var left = ref MemoryMarshal.GetReference(a);
        ref var right = ref MemoryMarshal.GetReference(b);
        nuint i = 0;
        for (; i < Whole(into.Length); i += Lanes)
        {
            (Vector512.LoadUnsafe(ref left, i) * Vector512.LoadUnsafe(ref right, i)).StoreUnsafe(ref target, i);
        }

        for (var j = (int)i; j < into.Length; j++)
        {
            into[j] = a[j] * b[j];
        }
    }

    /// <summary>into[i] = a[i] - b[i].</summary>
    public static void Subtract(ReadOnlySpan<double> a, ReadOnlySpan<double> b, Span<double> into)
    {
        ref var target = ref MemoryMarshal.GetReference(into);
        ref var left = ref MemoryMarshal.GetReference(a);
        ref var right = ref MemoryMarshal.GetReference(b);
        nuint i = 0;
        for (; i < Whole(into.Length); i += Lanes)
        {
            (Vector512.LoadUnsafe(ref left, i) - Vector512.LoadUnsafe(ref right, i)).StoreUnsafe(ref target, i);
        }

        for (var j = (int)i; j < into.Length; j++)
        {
            into[j] = a[j] - b[j];
        }
    }

    /// <summary>into[i] = a[i] / b[i].</summary>
    public static void Divide(ReadOnlySpan<double> a, ReadOnlySpan<double> b, Span<double> into)
    {
        ref var target = ref MemoryMarshal.GetReference(into);
        ref var left = ref MemoryMarshal.GetReference(a);
        ref var right = ref MemoryMarshal.GetReference(b);
        nuint i = 0;
        for (; i < Whole(into.Length); i += Lanes)
        {
            (Vector512.LoadUnsafe(ref left, i) / Vector512.LoadUnsafe(ref right, i)).StoreUnsafe(ref target, i);
        }

        for (var j = (int)i; j < into.Length; j++)
        {
            into[j] = a[j] / b[j];
        }
    }

    /// <summary>into[i] = column[i] - shift.</summary>
    public static void Shift(ReadOnlySpan<double> column, double shift, Span<double> into)
    {
        ref var target = ref MemoryMarshal.GetReference(into);
        ref var source = ref MemoryMarshal.GetReference(column);
        var by = Vector512.Create(shift);
        nuint i = 0;
        for (; i < Whole(into.Length); i += Lanes)
        {
            (Vector512.LoadUnsafe(ref source, i) - by).StoreUnsafe(ref target, i);
        }

        for (var j = (int)i; j < into.Length; j++)
        {
            into[j] = column[j] - shift;
        }
    }

    /// <summary>Least and greatest of the values and the two given; values are finite.</summary>
    public static (double Least, double Greatest) Range(ReadOnlySpan<double> column, double least, double greatest)
    {
        ref var source = ref MemoryMarshal.GetReference(column);
        var (low, high) = (Vector512.Create(least), Vector512.Create(greatest));
        nuint i = 0;
        for (; i < Whole(column.Length); i += Lanes)
        {
            var value = Vector512.LoadUnsafe(ref source, i);
            (low, high) = (Vector512.MinNative(low, value), Vector512.MaxNative(high, value));
        }

        for (var lane = 0; lane < Lanes; lane++)
        {
            (least, greatest) = (Math.Min(least, low[lane]), Math.Max(greatest, high[lane]));
        }

        foreach (var value in column[(int)i..])
        {
            (least, greatest) = (Math.Min(least, value), Math.Max(greatest, value));
        }

        return (least, greatest);
    }

    /// <summary>into[i] = 1 - a[i] - b[i]; returns the least of them.</summary>
    public static double Complement(ReadOnlySpan<double> a, ReadOnlySpan<double> b, Span<double> into)
    {
        ref var target = ref MemoryMarshal.GetReference(into);
        ref var left = ref MemoryMarshal.GetReference(a);
        ref var right = ref MemoryMarshal.GetReference(b);
        var low = Vector512.Create(double.PositiveInfinity);
        nuint i = 0;
        for (; i < Whole(into.Length); i += Lanes)
        {
            var value = Vector512<double>.One - Vector512.LoadUnsafe(ref left, i) - Vector512.LoadUnsafe(ref right, i);
            value.StoreUnsafe(ref target, i);
            low = Vector512.MinNative(low, value);
        }

        var least = double.PositiveInfinity;
        for (var lane = 0; lane < Lanes; lane++)
        {
            least = Math.Min(least, low[lane]);
        }

        for (var j = (int)i; j < into.Length; j++)
        {
            into[j] = 1 - a[j] - b[j];
            least = Math.Min(least, into[j]);
        }

        return least;
    }

    /// <summary>The largest absolute value, 0 for none; values are finite.</summary>
    public static double LargestAbsolute(ReadOnlySpan<double> column)
    {
        ref var source = ref MemoryMarshal.GetReference(column);
        var lanes = Vector512<double>.Zero;
        nuint i = 0;
        for (; i < Whole(column.Length); i += Lanes)
        {
            lanes = Vector512.MaxNative(lanes, Vector512.Abs(Vector512.LoadUnsafe(ref source, i)));
        }

        var four = Vector256.MaxNative(lanes.GetLower(), lanes.GetUpper());
        var two = Vector128.MaxNative(four.GetLower(), four.GetUpper());
        var largest = Math.Max(two[0], two[1]);
        foreach (var value in column[(int)i..])
        {
            largest = Math.Max(largest, Math.Abs(value));
        }

        return largest;
    }

    public static double SumLanes(Vector512<double> lanes)
    {
        var four = lanes.GetLower() + lanes.GetUpper();
        var two = four.GetLower() + four.GetUpper();
        return two[0] + two[1];
    }

    private static nuint Whole(int length) => (nuint)(length - (length % Lanes));
}
