using Auditor.Numerics.Storage;

namespace Auditor.Data;

/// <summary>How far the reading of a file has come.</summary>
/// <param name="Rows">Data rows read.</param>
/// <param name="Bytes">Bytes of the file as stored, taken out of it.</param>
/// <param name="AllBytes">All its bytes, when that can be known.</param>
public readonly record struct ReadingProgress(long Rows, long Bytes, long? AllBytes);

/// <summary>What the rows of a file are read with.</summary>
/// <param name="Rows">The number of data rows if it is known or nearly; a wrong number costs time, nothing else. 0: estimated from the first rows.</param>
/// <param name="Threads">Most threads to read with. No result depends on it.</param>
/// <param name="ChunkBytes">Bytes that a thread takes at a time. No result depends on it.</param>
public sealed record CsvReading(int Rows = 0, int Threads = 1, int ChunkBytes = 1 << 19, IProgress<ReadingProgress>? Progress = null)
{
    /// <summary>Where the columns are kept, once it is known what they hold.</summary>
    public Func<TableSize, CellStore> Store { get; init; } = _ => CellStore.Memory;
}

/// <summary>
/// One pass over data rows, straight into the columns' arrays. The threads take chunks in the order of the file, and the rows of a chunk are counted before
/// the next one is given out: every cell has its place before it is parsed, and no order is left to chance.
/// </summary>
internal sealed class CsvPass(CsvFile file, int fields, int[] positions, IReadOnlyList<ColumnBuilder> builders, CsvReading reading)
{
    private readonly Lock _taking = new();
    private readonly BusyCount _busy = new();
    private readonly List<CsvJob> _jobs = [];
    private bool _stopped;

    /// <summary>Data rows read.</summary>
    public int Rows => _jobs.Sum(job => job.Rows);

    /// <summary>About how many rows the whole file has.</summary>
    public double Expected { get; private set; }

    /// <param name="most">Stop after so many chunks.</param>
    public IReadOnlyList<Problem> Run(int most = int.MaxValue)
    {
        var (stored, text) = file.Open();
        using (stored)
        using (text)
        using (var chunks = new CsvChunks(text, reading.ChunkBytes))
        {
            var room = new RowRoom(stored, reading.Rows);
            var threads = Math.Min(reading.Threads, most);
            Parallel.For(0, threads, new ParallelOptions { MaxDegreeOfParallelism = threads }, _ => Work(chunks, room, most));
        }

        if (_jobs.Find(job => job.Fault is not null) is { } failed)
        {
            return [file.Problem(failed.Fault!)];
        }

        Resize(Rows);
        return UnusableRows.Problems(file.Name, [.. _jobs.Select(job => job.Unusable)]);
    }

    private void Work(CsvChunks chunks, RowRoom room, int most)
    {
        while (Take(chunks, room, most) is { } job)
        {
            job.Run(file, fields, positions);
            _stopped |= job.Fault is not null;
            _busy.Leave();
        }
    }

    /// <summary>The next chunk with room for its rows; null when there is none, or one has failed.</summary>
    private CsvJob? Take(CsvChunks chunks, RowRoom room, int most)
    {
        lock (_taking)
        {
            if (_stopped || _jobs.Count >= most)
            {
                return null;
            }

            try
            {
                return chunks.Next() is { } chunk ? Begin(chunk, room) : null;
            }
            catch (Exception fault)
            {
                _jobs.Add(new CsvJob(fault));
                _stopped = true;
                return null;
            }
        }
    }

    private CsvJob Begin(CsvChunk chunk, RowRoom room)
    {
        if (room.Grown(chunk) is { } rows)
        {
            _busy.WaitForNone();
            Resize(rows);
            Expected = room.Expected;
        }

        var job = new CsvJob(chunk, [.. builders.Select(builder => builder.NextPart(chunk.Row, chunk.Rows))]);
        _jobs.Add(job);
        _busy.Enter();
        reading.Progress?.Report(room.Progress(chunk));
        return job;
    }

    private void Resize(int rows)
    {
        foreach (var builder in builders)
        {
            builder.Resize(rows);
        }
    }

    /// <summary>How many threads are at work in the arrays.</summary>
    private sealed class BusyCount
    {
        private readonly object _gate = new();
        private int _busy;

        public void Enter()
        {
            lock (_gate)
            {
                _busy++;
            }
        }

        public void Leave()
        {
            lock (_gate)
            {
                _busy--;
                Monitor.PulseAll(_gate);
            }
        }

        public void WaitForNone()
        {
            lock (_gate)
            {
                while (_busy > 0)
                {
                    Monitor.Wait(_gate);
                }
            }
        }
    }
}
