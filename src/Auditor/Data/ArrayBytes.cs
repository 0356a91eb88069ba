using System.Buffers;
using System.Runtime.InteropServices;

namespace Auditor.Data;

/// <summary>An array of doubles seen as bytes, without a copy. The array stays where it is while pinned.</summary>
internal sealed class ArrayBytes(double[] values) : MemoryManager<byte>
{
    public override Span<byte> GetSpan() => MemoryMarshal.AsBytes(values.AsSpan());

    public override unsafe MemoryHandle Pin(int elementIndex = 0)
    {
        var handle = GCHandle.Alloc(values, GCHandleType.Pinned);
        return new MemoryHandle((byte*)handle.AddrOfPinnedObject() + elementIndex, handle, this);
    }

    /// <summary>The handle that was given out frees itself.</summary>
    public override void Unpin()
    {
    }

    protected override void Dispose(bool disposing)
    {
    }
}
