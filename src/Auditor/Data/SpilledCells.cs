using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using Auditor.Numerics.Storage;

namespace Auditor.Data;

/// <summary>Bytes that can be read and written anywhere, by several threads at once; made and taken away by the caller of the audit.</summary>
public interface IRandomAccessBytes : IDisposable
{
    /// <summary>Fills all of <paramref name="into"/>.</summary>
    void Read(long at, Span<byte> into);

    void Write(long at, ReadOnlySpan<byte> bytes);
}

/// <summary>Keeps every column in bytes of its own, until it is disposed of.</summary>
/// <param name="create">Empty bytes for one more column.</param>
public sealed class SpilledStore(Func<IRandomAccessBytes> create) : CellStore, IDisposable
{
    private readonly List<IDisposable> _made = [];

    public override WritableCells<T> Create<T>() => Kept(new SpilledCells<T>(Kept(create())));

    public void Dispose() => _made.ForEach(one => one.Dispose());

    /// <summary>Room for texts.</summary>
    internal SpilledTexts CreateTexts() => new(Create<long>(), Kept(create()));

    private T Kept<T>(T made)
        where T : IDisposable
    {
        lock (_made)
        {
            _made.Add(made);
        }

        return made;
    }
}

/// <summary>
/// Cells that are not in memory: one after the other in the order of the rows. Each thread keeps the run of rows it read last, so going through the rows in order
/// reads every byte once.
/// </summary>
internal sealed class SpilledCells<T>(IRandomAccessBytes bytes) : WritableCells<T>, IDisposable
    where T : unmanaged
{
    /// <summary>Rows that are read at a time: 128 KB of numbers.</summary>
    private const int RunRows = 1 << 14;

    private readonly ThreadLocal<Run> _runs = new(() => new Run());
    private int _count;
    private volatile int _version;

    public override int Count => _count;

    public override T this[int row]
    {
        get
        {
            var run = RunOf(row);
            return run.Values[row - run.First];
        }
    }

    public override void Read(int first, Span<T> into)
    {
        for (var done = 0; done < into.Length;)
        {
            var run = RunOf(first + done);
            var start = first + done - run.First;
            var length = Math.Min(into.Length - done, run.Count - start);
            run.Values.AsSpan(start, length).CopyTo(into[done..]);
            done += length;
        }
    }

    public override void Read(ReadOnlySpan<int> rows, Span<T> into)
    {
        if (AreConsecutive(rows))
        {
            Read(rows.IsEmpty ? 0 : rows[0], into[..rows.Length]);
            return;
        }

        for (var i = 0; i < rows.Length; i++)
        {
            into[i] = this[rows[i]];
        }
    }

    public override void Resize(int rows) => _count = rows;

    public override CellRange<T> Open(int first, int count, bool kept)
    {
        var range = new CellRange<T>(new T[count], first, first, count);
        if (kept)
        {
            bytes.Read(Place(first), MemoryMarshal.AsBytes(range.Values.AsSpan()));
        }

        return range;
    }

    public override void Close(CellRange<T> range)
    {
        bytes.Write(Place(range.First), MemoryMarshal.AsBytes(range.Values.AsSpan(0, range.Count)));
        Interlocked.Increment(ref _version);
    }

    public void Dispose() => _runs.Dispose();

    private static long Place(int row) => (long)row * Unsafe.SizeOf<T>();

    private Run RunOf(int row)
    {
        var run = _runs.Value!;
        if (run.Version != _version || (uint)(row - run.First) >= (uint)run.Count)
        {
            ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual((uint)row, (uint)_count, nameof(row));
            run.Load(bytes, row / RunRows * RunRows, _count, _version);
        }

        return run;
    }

    private sealed class Run
    {
        public T[] Values { get; private set; } = [];

        public int First { get; private set; }

        public int Count { get; private set; }

        public int Version { get; private set; } = -1;

        public void Load(IRandomAccessBytes bytes, int first, int rows, int version)
        {
            if (Values.Length == 0)
            {
                Values = GC.AllocateUninitializedArray<T>(RunRows);
            }

            (First, Count, Version) = (first, Math.Min(RunRows, rows - first), version);
            bytes.Read(Place(first), MemoryMarshal.AsBytes(Values.AsSpan(0, Count)));
        }
    }
}
