using System.Runtime.InteropServices;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Sorts many numbers by their bits, eleven at a time from the lowest: six looks at the numbers whatever their order, where comparing them takes twenty for a million.
/// </summary>
/// <remarks>Radix sort; the order of IEEE 754 numbers is that of their bits once those of negative ones are turned over. Common practice, no source.</remarks>
internal static class RisingOrder
{
    private const int Digit = 11;
    private const int Digits = 6;
    private const ulong Sign = 1UL << 63;

    /// <summary>Fewer are sorted by comparing.</summary>
    private const int Few = 10_000;

    /// <param name="values">None is NaN.</param>
    public static void Sort(double[] values)
    {
        if (values.Length < Few)
        {
            Array.Sort(values);
            return;
        }

        var bits = MemoryMarshal.Cast<double, ulong>(values.AsSpan());
        foreach (ref var key in bits)
        {
            key ^= (key & Sign) != 0 ? ulong.MaxValue : Sign;
        }

        Order(bits);
        foreach (ref var key in bits)
        {
            key ^= (key & Sign) != 0 ? Sign : ulong.MaxValue;
        }
    }

    /// <summary>The number of passes is even, so the keys end where they began.</summary>
    private static void Order(Span<ulong> keys)
    {
        var counts = new int[Digits << Digit];
        foreach (var key in keys)
        {
            for (var d = 0; d < Digits; d++)
            {
                counts[(d << Digit) + Part(key, d)]++;
            }
        }

        Span<ulong> from = keys, to = new ulong[keys.Length];
        for (var d = 0; d < Digits; d++)
        {
            Place(from, to, Starts(counts.AsSpan(d << Digit, 1 << Digit)), d);
            var next = from;
            from = to;
            to = next;
        }
    }

    private static void Place(ReadOnlySpan<ulong> from, Span<ulong> to, Span<int> starts, int digit)
    {
        foreach (var key in from)
        {
            to[starts[Part(key, digit)]++] = key;
        }
    }

    /// <summary>Puts sums of those before in the place of counts.</summary>
    private static Span<int> Starts(Span<int> counts)
    {
        var before = 0;
        foreach (ref var count in counts)
        {
            (count, before) = (before, before + count);
        }

        return counts;
    }

    private static int Part(ulong key, int digit) => (int)(key >> (digit * Digit)) & ((1 << Digit) - 1);
}
