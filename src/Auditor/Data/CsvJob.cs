namespace Auditor.Data;

/// <summary>One chunk of a file on its way into parts of columns.</summary>
internal sealed class CsvJob
{
    private readonly CsvChunk? _chunk;
    private readonly ColumnPart[] _parts = [];

    public CsvJob(CsvChunk chunk, ColumnPart[] parts) => (_chunk, _parts) = (chunk, parts);

    /// <summary>A chunk that could not even be taken out of the file.</summary>
    public CsvJob(Exception fault) => Fault = fault;

    /// <summary>What kept the chunk from being read.</summary>
    public Exception? Fault { get; private set; }

    /// <summary>Data rows read.</summary>
    public int Rows { get; private set; }

    public UnusableRows Unusable { get; private set; } = new();

    public void Run(CsvFile file, int fields, int[] positions)
    {
        try
        {
            using var chunk = _chunk!;
            var rows = new CsvRows(fields, positions, _parts, chunk.Row, chunk.Line);
            using (var reader = file.Reader(chunk.Text()))
            {
                rows.Read(reader, header: chunk.Index == 0);
            }

            Check(chunk, rows.Count);
            Array.ForEach(_parts, part => part.Close());
            (Rows, Unusable) = (rows.Count, rows.Unusable);
        }
        catch (Exception fault)
        {
            Fault = fault;
        }
    }

    /// <summary>Counted and read by different code: cells would stand in wrong rows if the two ever differed.</summary>
    private static void Check(CsvChunk chunk, int found)
    {
        if (chunk.Ends ? found > chunk.Rows : found != chunk.Rows)
        {
            throw new InvalidOperationException($"rows after {chunk.Row}: counted {chunk.Rows}, read {found}");
        }
    }
}
