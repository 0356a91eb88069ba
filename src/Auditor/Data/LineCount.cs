namespace Auditor.Data;

/// <summary>Counts the lines of a file from blocks of its bytes: an upper estimate of its rows, so that room for them can be made at once.</summary>
public sealed class LineCount
{
    private long _ends;
    private byte _last = (byte)'\n';

    /// <summary>Data rows if no cell holds a line end and no line at the end is blank.</summary>
    public int Rows => (int)Math.Clamp(_ends + (_last == '\n' ? 0 : 1) - 1, 0, Array.MaxLength);

    public void Add(ReadOnlySpan<byte> block)
    {
        _ends += block.Count((byte)'\n');
        _last = block.IsEmpty ? _last : block[^1];
    }
}
