using System.Globalization;
using Auditor.Data;
using Auditor.Numerics.Storage;
using Serilog;

namespace Auditor.Cli;

/// <summary>Decides where the columns of one run are kept: in memory where they fit, else in files beside the output that last as long as the run.</summary>
/// <param name="limit">Bytes they may take in memory; null: half of what is free.</param>
/// <param name="folder">The output folder.</param>
internal sealed class ColumnPlace(long? limit, string folder) : IDisposable
{
    /// <summary>Residual and leverage of each row.</summary>
    private const int BesideColumns = 2 * sizeof(double);

    /// <summary>What time, units, clusters and segments take for each row, pictures in time order included (measured with 2,000,000 rows).</summary>
    private const int OfStructure = 600;

    private readonly bool _folderIsNew = !Directory.Exists(folder);
    private SpilledStore? _spilled;

    /// <summary>Whether dependence between rows or parts of them are declared.</summary>
    public bool Structured { get; set; }

    public CellStore Chosen => (CellStore?)_spilled ?? CellStore.Memory;

    public CellStore For(TableSize size)
    {
        var (needed, allowed) = (size.Rows * (size.RowBytes + BesideColumns + (Structured ? OfStructure : 0)), limit ?? Free() / 2);
        if (needed <= allowed)
        {
            return CellStore.Memory;
        }

        Log.Debug(
            "The columns take about {Needed:l} MB, {Allowed:l} MB are allowed: they are kept in '{Folder:l}' while the audit runs", Megabytes(needed), Megabytes(allowed), folder);
        return _spilled ??= new SpilledStore(() => SpillFile.Create(folder));
    }

    public void Dispose()
    {
        _spilled?.Dispose();
        if (_spilled is not null && _folderIsNew && Directory.Exists(folder) && !Directory.EnumerateFileSystemEntries(folder).Any())
        {
            Directory.Delete(folder);
        }
    }

    /// <summary>Bytes of memory that nobody uses: what the system says, but no more than this process may have.</summary>
    private static long Free()
    {
        var most = GC.GetGCMemoryInfo().TotalAvailableMemoryBytes;
        return Math.Min(most, SystemMemory.Available() ?? most / 2);
    }

    private static string Megabytes(long bytes) => (bytes >> 20).ToString("#,0", CultureInfo.InvariantCulture);
}
