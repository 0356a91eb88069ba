namespace Auditor.Numerics.Storage;

/// <summary>Where values are kept of which there is one a row.</summary>
public abstract class CellStore
{
    /// <summary>In arrays.</summary>
    public static CellStore Memory { get; } = new InMemory();

    /// <summary>Cells without rows yet.</summary>
    public abstract WritableCells<T> Create<T>()
        where T : unmanaged;

    private sealed class InMemory : CellStore
    {
        public override WritableCells<T> Create<T>() => new ArrayCells<T>([]);
    }
}
