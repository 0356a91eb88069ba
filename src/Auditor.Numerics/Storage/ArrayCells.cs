namespace Auditor.Numerics.Storage;

/// <summary>Cells in memory.</summary>
public sealed class ArrayCells<T>(T[] values) : WritableCells<T>
    where T : unmanaged
{
    private T[] _values = values;

    public override int Count => _values.Length;

    public override T this[int row] => _values[row];

    public override void Read(int first, Span<T> into) => _values.AsSpan(first, into.Length).CopyTo(into);

    public override void Read(ReadOnlySpan<int> rows, Span<T> into)
    {
        if (AreConsecutive(rows))
        {
            Read(rows.IsEmpty ? 0 : rows[0], into[..rows.Length]);
            return;
        }

        var values = _values;
        for (var i = 0; i < rows.Length; i++)
        {
            into[i] = values[rows[i]];
        }
    }

    /// <summary>The array itself.</summary>
    public override T[] ToArray() => _values;

    /// <summary>Without clearing the room first: every row is set before it is looked at.</summary>
    public override void Resize(int rows)
    {
        if (_values.Length == rows)
        {
            return;
        }

        var resized = GC.AllocateUninitializedArray<T>(rows);
        _values.AsSpan(0, Math.Min(_values.Length, rows)).CopyTo(resized);
        _values = resized;
    }

    public override CellRange<T> Open(int first, int count, bool kept) => new(_values, 0, first, count);

    public override void Close(CellRange<T> range)
    {
    }
}
