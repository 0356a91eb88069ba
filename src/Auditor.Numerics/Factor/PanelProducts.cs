using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace Auditor.Numerics.Factor;

/// <summary>Products of the eight columns of a panel among themselves; columns as in <see cref="PanelKernels"/>.</summary>
internal static class PanelProducts
{
    private const int Lanes = 8;

    /// <summary>products[8 j + i] = v_i'v_j for i below j; 64 entries, the others are left alone.</summary>
    public static void Fill(ref double panel, nuint stride, nuint rows, Span<double> products)
    {
        Between(ref panel, stride, rows, products);
        Within(ref panel, stride, rows, products);
        Within(ref Unsafe.Add(ref panel, 4 * stride), stride, rows, products[36..]);
    }

    /// <summary>The first four columns with the last four.</summary>
    private static void Between(ref double panel, nuint stride, nuint rows, Span<double> products)
    {
        ref var v1 = ref Unsafe.Add(ref panel, stride);
        ref var v2 = ref Unsafe.Add(ref v1, stride);
        ref var v3 = ref Unsafe.Add(ref v2, stride);
        for (var j = 4; j < PanelKernels.Width; j += 2)
        {
            ref var a = ref Unsafe.Add(ref panel, (nuint)j * stride);
            ref var b = ref Unsafe.Add(ref a, stride);
            Vector512<double> a0 = default, a1 = default, a2 = default, a3 = default, b0 = default, b1 = default, b2 = default, b3 = default;
            for (nuint i = 0; i < rows; i += Lanes)
            {
                var (ai, bi) = (Vector512.LoadUnsafe(ref a, i), Vector512.LoadUnsafe(ref b, i));
                var v = Vector512.LoadUnsafe(ref panel, i);
                (a0, b0) = (Vector512.FusedMultiplyAdd(v, ai, a0), Vector512.FusedMultiplyAdd(v, bi, b0));
                v = Vector512.LoadUnsafe(ref v1, i);
                (a1, b1) = (Vector512.FusedMultiplyAdd(v, ai, a1), Vector512.FusedMultiplyAdd(v, bi, b1));
                v = Vector512.LoadUnsafe(ref v2, i);
                (a2, b2) = (Vector512.FusedMultiplyAdd(v, ai, a2), Vector512.FusedMultiplyAdd(v, bi, b2));
                v = Vector512.LoadUnsafe(ref v3, i);
                (a3, b3) = (Vector512.FusedMultiplyAdd(v, ai, a3), Vector512.FusedMultiplyAdd(v, bi, b3));
            }

            Store(products[(8 * j)..], a0, a1, a2, a3);
            Store(products[(8 * (j + 1))..], b0, b1, b2, b3);
        }
    }

    /// <summary>Four columns with each other.</summary>
    private static void Within(ref double panel, nuint stride, nuint rows, Span<double> products)
    {
        ref var v1 = ref Unsafe.Add(ref panel, stride);
        ref var v2 = ref Unsafe.Add(ref v1, stride);
        ref var v3 = ref Unsafe.Add(ref v2, stride);
        Vector512<double> p01 = default, p02 = default, p03 = default, p12 = default, p13 = default, p23 = default;
        for (nuint i = 0; i < rows; i += Lanes)
        {
            var (a, b) = (Vector512.LoadUnsafe(ref panel, i), Vector512.LoadUnsafe(ref v1, i));
            var (c, d) = (Vector512.LoadUnsafe(ref v2, i), Vector512.LoadUnsafe(ref v3, i));
            p01 = Vector512.FusedMultiplyAdd(a, b, p01);
            p02 = Vector512.FusedMultiplyAdd(a, c, p02);
            p03 = Vector512.FusedMultiplyAdd(a, d, p03);
            p12 = Vector512.FusedMultiplyAdd(b, c, p12);
            p13 = Vector512.FusedMultiplyAdd(b, d, p13);
            p23 = Vector512.FusedMultiplyAdd(c, d, p23);
        }

        products[8] = BlockKernels.SumLanes(p01);
        (products[16], products[17]) = (BlockKernels.SumLanes(p02), BlockKernels.SumLanes(p12));
        (products[24], products[25], products[26]) = (BlockKernels.SumLanes(p03), BlockKernels.SumLanes(p13), BlockKernels.SumLanes(p23));
    }

    private static void Store(Span<double> into, Vector512<double> a, Vector512<double> b, Vector512<double> c, Vector512<double> d)
    {
        (into[0], into[1]) = (BlockKernels.SumLanes(a), BlockKernels.SumLanes(b));
        (into[2], into[3]) = (BlockKernels.SumLanes(c), BlockKernels.SumLanes(d));
    }
}
