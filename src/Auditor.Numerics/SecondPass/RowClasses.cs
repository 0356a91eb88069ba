namespace Auditor.Numerics.SecondPass;

/// <summary>
/// Which cluster, unit or period each row of a row set belongs to.
/// </summary>
public sealed class RowClasses
{
    private readonly int[] _codes;

    /// <param name="codes">For each row, in the order of the rows, 0 to count - 1; every code occurs. Periods: the rank of the row's period in time.</param>
    /// <param name="count">Number of classes.</param>
    /// <exception cref="ArgumentException">A code is out of range, or one does not occur.</exception>
    public RowClasses(int[] codes, int count)
    {
        var seen = new bool[count];
        foreach (var code in codes)
        {
            seen[code >= 0 && code < count ? code : throw new ArgumentException("a row's class is out of range", nameof(codes))] = true;
        }

        (_codes, Count) = (codes, Array.TrueForAll(seen, one => one) ? count : throw new ArgumentException("a class has no row", nameof(codes)));
    }

    public ReadOnlySpan<int> Codes => _codes;

    public int Count { get; }

    /// <summary>Classes by the rank of any whole numbers: a subset of rows whose codes have gaps, periods by their place in time.</summary>
    public static RowClasses Ranked(ReadOnlySpan<int> values)
    {
        int[] distinct = [.. values.ToArray().Distinct().Order()];
        var codes = new int[values.Length];
        for (var i = 0; i < codes.Length; i++)
        {
            codes[i] = Array.BinarySearch(distinct, values[i]);
        }

        return new RowClasses(codes, distinct.Length);
    }
}

/// <summary>What was declared of the dependence between rows; nothing is computed for what is absent.</summary>
public sealed record DependenceStructure
{
    /// <summary>Errors of different clusters are independent.</summary>
    public RowClasses? Cluster { get; init; }

    /// <summary>The unit that is observed repeatedly.</summary>
    public RowClasses? Unit { get; init; }

    /// <summary>Observed periods in the order of time.</summary>
    public RowClasses? Period { get; init; }

    /// <summary>Doubles that the sums of all groups by one kind of class may take (256 MB); when they are more, the rows are passed several times.</summary>
    public long MostDoubles { get; init; } = 1L << 25;
}
