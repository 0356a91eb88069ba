namespace Auditor.Numerics.SecondPass;

/// <summary>
/// The classes whose sums are collected in one pass over the rows: all of them when their sums fit in memory, otherwise as many as do, and the rows
/// are passed again for the next.
/// </summary>
internal sealed class ClassWindow(RowClasses classes, long doublesPerClass, long mostDoubles)
{
    private int _first;

    public RowClasses Classes { get; } = classes;

    public int Size { get; } = (int)Math.Clamp(mostDoubles / Math.Max(1, doublesPerClass), 1, classes.Count);

    public bool HoldsAll => Size == Classes.Count;

    /// <summary>The class (code) at a place of the window; places beyond the last class are not used.</summary>
    public IEnumerable<(int Place, int Code)> Held =>
        Enumerable.Range(0, Math.Min(Size, Classes.Count - _first)).Select(place => (place, _first + place));

    /// <summary>Place within the window of a row's class, null when it is not held now.</summary>
    public int? Place(int row)
    {
        var place = Classes.Codes[row] - _first;
        return place >= 0 && place < Size ? place : null;
    }

    /// <summary>Moves on; false when no class is left.</summary>
    public bool Next()
    {
        _first = Math.Min(Classes.Count, _first + Size);
        return _first < Classes.Count;
    }
}
