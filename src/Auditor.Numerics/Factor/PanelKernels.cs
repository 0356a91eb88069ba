using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace Auditor.Numerics.Factor;

/// <summary>
/// Inner loops of the row-block factorisation: a panel of eight neighbouring columns against one or two others. Column k of the panel starts
/// k strides after the first; all columns are given by their first element and hold a multiple of 16 rows (zeros fill up). Lanes as in <see cref="BlockKernels"/>.
/// </summary>
internal static class PanelKernels
{
    public const int Width = 8;

    /// <summary>Rows come in multiples of so many: two vectors of eight.</summary>
    public const int RowStep = 16;

    private const int Lanes = 8;

    /// <summary>The products of the eight columns with a and with b.</summary>
    public static (Vector512<double> WithA, Vector512<double> WithB) Dots(ref double panel, nuint stride, ref double a, ref double b, nuint rows)
    {
        ref var v1 = ref Unsafe.Add(ref panel, stride);
        ref var v2 = ref Unsafe.Add(ref v1, stride);
        ref var v3 = ref Unsafe.Add(ref v2, stride);
        ref var v4 = ref Unsafe.Add(ref v3, stride);
        ref var v5 = ref Unsafe.Add(ref v4, stride);
        ref var v6 = ref Unsafe.Add(ref v5, stride);
        ref var v7 = ref Unsafe.Add(ref v6, stride);
        Vector512<double> a0 = default, a1 = default, a2 = default, a3 = default, a4 = default, a5 = default, a6 = default, a7 = default;
        Vector512<double> b0 = default, b1 = default, b2 = default, b3 = default, b4 = default, b5 = default, b6 = default, b7 = default;
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
            v = Vector512.LoadUnsafe(ref v4, i);
            (a4, b4) = (Vector512.FusedMultiplyAdd(v, ai, a4), Vector512.FusedMultiplyAdd(v, bi, b4));
            v = Vector512.LoadUnsafe(ref v5, i);
            (a5, b5) = (Vector512.FusedMultiplyAdd(v, ai, a5), Vector512.FusedMultiplyAdd(v, bi, b5));
            v = Vector512.LoadUnsafe(ref v6, i);
            (a6, b6) = (Vector512.FusedMultiplyAdd(v, ai, a6), Vector512.FusedMultiplyAdd(v, bi, b6));
            v = Vector512.LoadUnsafe(ref v7, i);
            (a7, b7) = (Vector512.FusedMultiplyAdd(v, ai, a7), Vector512.FusedMultiplyAdd(v, bi, b7));
        }

        return (Sums(a0, a1, a2, a3, a4, a5, a6, a7), Sums(b0, b1, b2, b3, b4, b5, b6, b7));
    }

    /// <summary>The products of the eight columns with a.</summary>
    public static Vector512<double> Dots(ref double panel, nuint stride, ref double a, nuint rows)
    {
        ref var v1 = ref Unsafe.Add(ref panel, stride);
        ref var v2 = ref Unsafe.Add(ref v1, stride);
        ref var v3 = ref Unsafe.Add(ref v2, stride);
        ref var v4 = ref Unsafe.Add(ref v3, stride);
        ref var v5 = ref Unsafe.Add(ref v4, stride);
        ref var v6 = ref Unsafe.Add(ref v5, stride);
        ref var v7 = ref Unsafe.Add(ref v6, stride);
        Vector512<double> a0 = default, a1 = default, a2 = default, a3 = default, a4 = default, a5 = default, a6 = default, a7 = default;
        for (nuint i = 0; i < rows; i += Lanes)
        {
            var ai = Vector512.LoadUnsafe(ref a, i);
            a0 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref panel, i), ai, a0);
            a1 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v1, i), ai, a1);
            a2 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v2, i), ai, a2);
            a3 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v3, i), ai, a3);
            a4 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v4, i), ai, a4);
            a5 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v5, i), ai, a5);
            a6 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v6, i), ai, a6);
            a7 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v7, i), ai, a7);
        }

        return Sums(a0, a1, a2, a3, a4, a5, a6, a7);
    }

    /// <summary>a -= the eight columns times the factors for a, b likewise.</summary>
    public static void Subtract(
        ref double panel, nuint stride, ref double a, ref double b, nuint rows, Vector512<double> forA, Vector512<double> forB)
    {
        ref var v1 = ref Unsafe.Add(ref panel, stride);
        ref var v2 = ref Unsafe.Add(ref v1, stride);
        ref var v3 = ref Unsafe.Add(ref v2, stride);
        ref var v4 = ref Unsafe.Add(ref v3, stride);
        ref var v5 = ref Unsafe.Add(ref v4, stride);
        ref var v6 = ref Unsafe.Add(ref v5, stride);
        ref var v7 = ref Unsafe.Add(ref v6, stride);
        var (a0, a1, a2, a3, a4, a5, a6, a7) = Spread(-forA);
        var (b0, b1, b2, b3, b4, b5, b6, b7) = Spread(-forB);
        for (nuint i = 0; i < rows; i += Lanes)
        {
            var (ai, bi) = (Vector512.LoadUnsafe(ref a, i), Vector512.LoadUnsafe(ref b, i));
            var v = Vector512.LoadUnsafe(ref panel, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a0, ai), Vector512.FusedMultiplyAdd(v, b0, bi));
            v = Vector512.LoadUnsafe(ref v1, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a1, ai), Vector512.FusedMultiplyAdd(v, b1, bi));
            v = Vector512.LoadUnsafe(ref v2, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a2, ai), Vector512.FusedMultiplyAdd(v, b2, bi));
            v = Vector512.LoadUnsafe(ref v3, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a3, ai), Vector512.FusedMultiplyAdd(v, b3, bi));
            v = Vector512.LoadUnsafe(ref v4, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a4, ai), Vector512.FusedMultiplyAdd(v, b4, bi));
            v = Vector512.LoadUnsafe(ref v5, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a5, ai), Vector512.FusedMultiplyAdd(v, b5, bi));
            v = Vector512.LoadUnsafe(ref v6, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a6, ai), Vector512.FusedMultiplyAdd(v, b6, bi));
            v = Vector512.LoadUnsafe(ref v7, i);
            (ai, bi) = (Vector512.FusedMultiplyAdd(v, a7, ai), Vector512.FusedMultiplyAdd(v, b7, bi));
            ai.StoreUnsafe(ref a, i);
            bi.StoreUnsafe(ref b, i);
        }
    }

    /// <summary>a -= the eight columns times the factors.</summary>
    public static void Subtract(ref double panel, nuint stride, ref double a, nuint rows, Vector512<double> factors)
    {
        ref var v1 = ref Unsafe.Add(ref panel, stride);
        ref var v2 = ref Unsafe.Add(ref v1, stride);
        ref var v3 = ref Unsafe.Add(ref v2, stride);
        ref var v4 = ref Unsafe.Add(ref v3, stride);
        ref var v5 = ref Unsafe.Add(ref v4, stride);
        ref var v6 = ref Unsafe.Add(ref v5, stride);
        ref var v7 = ref Unsafe.Add(ref v6, stride);
        var (a0, a1, a2, a3, a4, a5, a6, a7) = Spread(-factors);
        for (nuint i = 0; i < rows; i += Lanes)
        {
            var ai = Vector512.LoadUnsafe(ref a, i);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref panel, i), a0, ai);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v1, i), a1, ai);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v2, i), a2, ai);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v3, i), a3, ai);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v4, i), a4, ai);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v5, i), a5, ai);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v6, i), a6, ai);
            ai = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v7, i), a7, ai);
            ai.StoreUnsafe(ref a, i);
        }
    }

    /// <summary>next += factor v; then next'next.</summary>
    public static double UpdateLead(ref double v, ref double next, double factor, nuint rows)
    {
        var f = Vector512.Create(factor);
        Vector512<double> even = default, odd = default;
        for (nuint i = 0; i < rows; i += RowStep)
        {
            var n0 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v, i), f, Vector512.LoadUnsafe(ref next, i));
            var n1 = Vector512.FusedMultiplyAdd(Vector512.LoadUnsafe(ref v, i + Lanes), f, Vector512.LoadUnsafe(ref next, i + Lanes));
            n0.StoreUnsafe(ref next, i);
            n1.StoreUnsafe(ref next, i + Lanes);
            (even, odd) = (Vector512.FusedMultiplyAdd(n0, n0, even), Vector512.FusedMultiplyAdd(n1, n1, odd));
        }

        return BlockKernels.SumLanes(even + odd);
    }

    /// <summary>next += f v, a += g v; then next'next and next'a.</summary>
    public static (double Own, double WithA) UpdateLead(ref double v, ref double next, ref double a, double factor, double factorA, nuint rows)
    {
        var (f, g) = (Vector512.Create(factor), Vector512.Create(factorA));
        Vector512<double> even = default, odd = default, evenA = default, oddA = default;
        for (nuint i = 0; i < rows; i += RowStep)
        {
            var (v0, v1) = (Vector512.LoadUnsafe(ref v, i), Vector512.LoadUnsafe(ref v, i + Lanes));
            var n0 = Vector512.FusedMultiplyAdd(v0, f, Vector512.LoadUnsafe(ref next, i));
            var n1 = Vector512.FusedMultiplyAdd(v1, f, Vector512.LoadUnsafe(ref next, i + Lanes));
            var a0 = Vector512.FusedMultiplyAdd(v0, g, Vector512.LoadUnsafe(ref a, i));
            var a1 = Vector512.FusedMultiplyAdd(v1, g, Vector512.LoadUnsafe(ref a, i + Lanes));
            n0.StoreUnsafe(ref next, i);
            n1.StoreUnsafe(ref next, i + Lanes);
            a0.StoreUnsafe(ref a, i);
            a1.StoreUnsafe(ref a, i + Lanes);
            (even, odd) = (Vector512.FusedMultiplyAdd(n0, n0, even), Vector512.FusedMultiplyAdd(n1, n1, odd));
            (evenA, oddA) = (Vector512.FusedMultiplyAdd(n0, a0, evenA), Vector512.FusedMultiplyAdd(n1, a1, oddA));
        }

        return (BlockKernels.SumLanes(even + odd), BlockKernels.SumLanes(evenA + oddA));
    }

    /// <summary>a += f v, b += g v; then next'a and next'b.</summary>
    public static (double WithA, double WithB) UpdatePair(
        ref double v, ref double next, ref double a, ref double b, double factorA, double factorB, nuint rows)
    {
        var (f, g) = (Vector512.Create(factorA), Vector512.Create(factorB));
        Vector512<double> evenA = default, oddA = default, evenB = default, oddB = default;
        for (nuint i = 0; i < rows; i += RowStep)
        {
            var (v0, v1) = (Vector512.LoadUnsafe(ref v, i), Vector512.LoadUnsafe(ref v, i + Lanes));
            var (n0, n1) = (Vector512.LoadUnsafe(ref next, i), Vector512.LoadUnsafe(ref next, i + Lanes));
            var a0 = Vector512.FusedMultiplyAdd(v0, f, Vector512.LoadUnsafe(ref a, i));
            var a1 = Vector512.FusedMultiplyAdd(v1, f, Vector512.LoadUnsafe(ref a, i + Lanes));
            var b0 = Vector512.FusedMultiplyAdd(v0, g, Vector512.LoadUnsafe(ref b, i));
            var b1 = Vector512.FusedMultiplyAdd(v1, g, Vector512.LoadUnsafe(ref b, i + Lanes));
            a0.StoreUnsafe(ref a, i);
            a1.StoreUnsafe(ref a, i + Lanes);
            b0.StoreUnsafe(ref b, i);
            b1.StoreUnsafe(ref b, i + Lanes);
            (evenA, oddA) = (Vector512.FusedMultiplyAdd(n0, a0, evenA), Vector512.FusedMultiplyAdd(n1, a1, oddA));
            (evenB, oddB) = (Vector512.FusedMultiplyAdd(n0, b0, evenB), Vector512.FusedMultiplyAdd(n1, b1, oddB));
        }

        return (BlockKernels.SumLanes(evenA + oddA), BlockKernels.SumLanes(evenB + oddB));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector512<double> Sums(
        Vector512<double> a, Vector512<double> b, Vector512<double> c, Vector512<double> d, Vector512<double> e, Vector512<double> f, Vector512<double> g, Vector512<double> h) =>
        Vector512.Create(
            BlockKernels.SumLanes(a), BlockKernels.SumLanes(b), BlockKernels.SumLanes(c), BlockKernels.SumLanes(d),
            BlockKernels.SumLanes(e), BlockKernels.SumLanes(f), BlockKernels.SumLanes(g), BlockKernels.SumLanes(h));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static (Vector512<double> F0, Vector512<double> F1, Vector512<double> F2, Vector512<double> F3, Vector512<double> F4, Vector512<double> F5, Vector512<double> F6, Vector512<double> F7) Spread(
        Vector512<double> factors) =>
        (Vector512.Create(factors[0]), Vector512.Create(factors[1]), Vector512.Create(factors[2]), Vector512.Create(factors[3]),
            Vector512.Create(factors[4]), Vector512.Create(factors[5]), Vector512.Create(factors[6]), Vector512.Create(factors[7]));
}
