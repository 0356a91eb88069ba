namespace Auditor.Numerics.Storage;

/// <summary>Cells on their way in. Several threads may fill rows of their own at once.</summary>
public abstract class WritableCells<T> : Cells<T>
    where T : unmanaged
{
    /// <summary>Room for so many rows, those that are there kept. Not while rows are being filled.</summary>
    public abstract void Resize(int rows);

    /// <summary>Where the values of some consecutive rows are to be put.</summary>
    /// <param name="kept">Whether the values that are there are needed.</param>
    public abstract CellRange<T> Open(int first, int count, bool kept);

    /// <summary>The values of those rows are there.</summary>
    public abstract void Close(CellRange<T> range);

    /// <summary>Puts the values of consecutive rows in their place.</summary>
    public void Write(int first, ReadOnlySpan<T> values)
    {
        var range = Open(first, values.Length, kept: false);
        values.CopyTo(range.Values.AsSpan(first - range.Offset, values.Length));
        Close(range);
    }
}

/// <summary>Consecutive rows that may be filled.</summary>
/// <param name="Values">The value of row r is at r - Offset.</param>
/// <param name="First">The first row that may be touched.</param>
/// <param name="Count">How many may be.</param>
public readonly record struct CellRange<T>(T[] Values, int Offset, int First, int Count);
