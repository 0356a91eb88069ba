namespace Auditor.Numerics.Factor;

/// <summary>Takes parts as they get ready and merges them in their order, so that rounding does not depend on which was ready first; keeps no more than are waiting.</summary>
/// <param name="merge">Adds the second to the first.</param>
internal sealed class OrderedMerge<T>(int count, Action<T, T> merge)
    where T : class
{
    private readonly T?[] _waiting = new T?[count];
    private readonly Lock _merging = new();
    private int _next;

    /// <summary>The first part with all merged so far.</summary>
    public T? Merged { get; private set; }

    public void Take(int place, T part)
    {
        lock (_merging)
        {
            _waiting[place] = part;
            for (; _next < count && _waiting[_next] is { } ready; _next++)
            {
                _waiting[_next] = null;
                Add(ready);
            }
        }
    }

    private void Add(T part)
    {
        if (Merged is null)
        {
            Merged = part;
        }
        else
        {
            merge(Merged, part);
        }
    }
}
