namespace Auditor.Data;

internal static class Arrays
{
    /// <summary>As Array.Resize, without clearing the room for plain values first: every row is set before it is looked at.</summary>
    public static void Resize<T>(ref T[] items, int length)
    {
        if (items.Length == length)
        {
            return;
        }

        var resized = GC.AllocateUninitializedArray<T>(length);
        items.AsSpan(0, Math.Min(items.Length, length)).CopyTo(resized);
        items = resized;
    }
}
