namespace Auditor.Data;

/// <summary>An array filled from the front whose length was estimated: grows when the estimate was short and is cut when it was long.</summary>
internal sealed class GrowingArray<T>(int expected)
{
    private T[] _items = new T[Math.Max(expected, 4)];

    public int Count { get; private set; }

    public void Add(T item)
    {
        if (Count == _items.Length)
        {
            Array.Resize(ref _items, (int)Math.Min(2L * Count, Array.MaxLength));
        }

        _items[Count++] = item;
    }

    /// <summary>The items, without a copy when the estimate was exact.</summary>
    public T[] ToExactArray()
    {
        Array.Resize(ref _items, Count);
        return _items;
    }
}
