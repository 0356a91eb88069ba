using Auditor.Data;

namespace Auditor.Tests.Data;

/// <summary>Cells that are kept as bytes elsewhere give what was put in, in runs, one by one and among many threads.</summary>
public sealed class SpilledCellsTests
{
    private const int Rows = 50_003;

    [Fact]
    public void Runs_written_in_any_order_are_read_back()
    {
        using var store = new SpilledStore(() => new MemoryBytes());
        var cells = store.Create<double>();
        cells.Resize(Rows);
        var runs = Enumerable.Range(0, (Rows + 999) / 1000).OrderBy(run => run * 7919 % 51).ToList();
        runs.ForEach(run => cells.Write(run * 1000, [.. Enumerable.Range(run * 1000, Math.Min(1000, Rows - (run * 1000))).Select(Value)]));

        Assert.Equal(Rows, cells.Count);
        Assert.Equal(Enumerable.Range(0, Rows).Select(Value), cells);
        var part = new double[20_000];
        cells.Read(15_000, part);
        Assert.Equal(Enumerable.Range(15_000, part.Length).Select(Value), part);
        int[] some = [3, 16_383, 16_384, 40_000, Rows - 1];
        cells.Read(some, part);
        Assert.Equal(some.Select(Value), part.Take(some.Length));
    }

    [Fact]
    public void What_is_written_anew_is_read_anew()
    {
        using var store = new SpilledStore(() => new MemoryBytes());
        var cells = store.Create<int>();
        cells.Resize(10);
        cells.Write(0, [1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
        Assert.Equal(4, cells[3]);
        cells.Write(3, [40]);
        Assert.Equal([1, 2, 3, 40, 5, 6, 7, 8, 9, 10], cells);
    }

    [Fact]
    public void Several_threads_read_at_once()
    {
        using var store = new SpilledStore(() => new MemoryBytes());
        var cells = store.Create<double>();
        cells.Resize(Rows);
        cells.Write(0, [.. Enumerable.Range(0, Rows).Select(Value)]);
        var wrong = 0;
        Parallel.For(0, 8, thread =>
        {
            for (var row = thread; row < Rows; row += 8)
            {
                Interlocked.Add(ref wrong, cells[row] == Value(row) ? 0 : 1);
            }
        });
        Assert.Equal(0, wrong);
        Assert.Throws<ArgumentOutOfRangeException>(() => cells[Rows]);
    }

    [Fact]
    public void Texts_come_back_and_none_stays_none()
    {
        using var store = new SpilledStore(() => new MemoryBytes());
        string?[] expected = ["first", null, "", "naïve ürünler 🚜", new string('x', 5000), null, "last"];
        var texts = store.CreateTexts();
        texts.Resize(expected.Length);
        foreach (var (first, count) in new[] { (4, 3), (0, 4) })
        {
            var gathered = texts.Gather(first, count);
            for (var row = first; row < first + count; row++)
            {
                if (expected[row] is { } text)
                {
                    gathered.Set(row, text);
                }
                else
                {
                    gathered.SetMissing(row);
                }
            }

            gathered.Write();
        }

        Assert.Equal(expected, texts);
    }

    private static double Value(int row) => Math.Sqrt(row) - 3;

    private sealed class MemoryBytes : IRandomAccessBytes
    {
        private readonly Lock _lock = new();
        private byte[] _bytes = [];

        public void Read(long at, Span<byte> into)
        {
            lock (_lock)
            {
                _bytes.AsSpan((int)at, into.Length).CopyTo(into);
            }
        }

        public void Write(long at, ReadOnlySpan<byte> bytes)
        {
            lock (_lock)
            {
                Array.Resize(ref _bytes, Math.Max(_bytes.Length, (int)at + bytes.Length));
                bytes.CopyTo(_bytes.AsSpan((int)at));
            }
        }

        public void Dispose()
        {
        }
    }
}
