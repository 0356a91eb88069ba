using System.Buffers;
using System.Buffers.Binary;
using System.Collections;
using System.Text;
using Auditor.Numerics.Storage;

namespace Auditor.Data;

/// <summary>Texts that are not in memory: their UTF-8 bytes one after the other as they came, and for each row where its text begins, -1 for none.</summary>
internal sealed class SpilledTexts(WritableCells<long> places, IRandomAccessBytes bytes) : IReadOnlyList<string?>
{
    private long _end;

    public int Count => places.Count;

    private IRandomAccessBytes Bytes => bytes;

    private WritableCells<long> Places => places;

    public string? this[int row] => places[row] is >= 0 and var at ? TextAt(at) : null;

    public void Resize(int rows) => places.Resize(rows);

    /// <summary>Where the next rows' texts are gathered before they are written together.</summary>
    public Gathered Gather(int first, int count) => new(this, places.Open(first, count, kept: false));

    public IEnumerator<string?> GetEnumerator()
    {
        for (var row = 0; row < Count; row++)
        {
            yield return this[row];
        }
    }

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();

    private string TextAt(long at)
    {
        Span<byte> length = stackalloc byte[sizeof(int)];
        bytes.Read(at, length);
        var text = new byte[BinaryPrimitives.ReadInt32LittleEndian(length)];
        bytes.Read(at + sizeof(int), text);
        return Encoding.UTF8.GetString(text);
    }

    /// <summary>Texts of consecutive rows on their way.</summary>
    public sealed class Gathered(SpilledTexts texts, CellRange<long> places)
    {
        private readonly ArrayBufferWriter<byte> _bytes = new();

        public void Set(int row, ReadOnlySpan<char> text)
        {
            places.Values[row - places.Offset] = _bytes.WrittenCount;
            var target = _bytes.GetSpan(sizeof(int) + Encoding.UTF8.GetMaxByteCount(text.Length));
            var length = Encoding.UTF8.GetBytes(text, target[sizeof(int)..]);
            BinaryPrimitives.WriteInt32LittleEndian(target, length);
            _bytes.Advance(sizeof(int) + length);
        }

        public void SetMissing(int row) => places.Values[row - places.Offset] = -1;

        public void Write()
        {
            var at = Interlocked.Add(ref texts._end, _bytes.WrittenCount) - _bytes.WrittenCount;
            texts.Bytes.Write(at, _bytes.WrittenSpan);
            foreach (ref var place in places.Values.AsSpan(0, places.Count))
            {
                place = place < 0 ? -1 : place + at;
            }

            texts.Places.Close(places);
        }
    }
}
