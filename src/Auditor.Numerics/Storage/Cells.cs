using System.Collections;

namespace Auditor.Numerics.Storage;

/// <summary>One value a row, n of them: an array where there is memory for it, else kept elsewhere and read a run of rows at a time.</summary>
public abstract class Cells<T> : IReadOnlyList<T>
    where T : unmanaged
{
    /// <summary>Number of rows n.</summary>
    public abstract int Count { get; }

    /// <summary>The value of a row, 0-based. In rising order it is quick wherever the values are kept.</summary>
    public abstract T this[int row] { get; }

    /// <summary>The values of consecutive rows, as many as there is room for. Several threads may read at once.</summary>
    public abstract void Read(int first, Span<T> into);

    /// <summary>The values of some rows, rising.</summary>
    public abstract void Read(ReadOnlySpan<int> rows, Span<T> into);

    /// <summary>All values in one array; not for more rows than there is memory for.</summary>
    public virtual T[] ToArray()
    {
        var all = new T[Count];
        Read(0, all);
        return all;
    }

    public IEnumerator<T> GetEnumerator()
    {
        for (var row = 0; row < Count; row++)
        {
            yield return this[row];
        }
    }

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();

    /// <summary>Whether rising rows follow one another without a gap.</summary>
    protected static bool AreConsecutive(ReadOnlySpan<int> rows) => rows.IsEmpty || rows[^1] - rows[0] == rows.Length - 1;
}
