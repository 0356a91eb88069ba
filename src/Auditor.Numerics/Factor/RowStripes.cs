namespace Auditor.Numerics.Factor;

/// <summary>How a row set is cut into stripes of whole blocks of nearly equal size.</summary>
/// <param name="Rows">Rows of the set.</param>
/// <param name="Columns">All columns of the design.</param>
public readonly record struct RowStripes(int Rows, int Columns)
{
    /// <summary>Enough to keep the processors of a workstation busy; more would cost merges.</summary>
    private const int Most = 16;

    /// <summary>A stripe has at least so many rows ...</summary>
    private const int FewestRows = 8_192;

    /// <summary>... and so many for each column: merging two factors costs as much as about a third of a row for each column.</summary>
    private const int RowsPerColumn = 32;

    /// <summary>One or more.</summary>
    public int Count => (int)Math.Clamp(Rows / Math.Max(FewestRows, (long)RowsPerColumn * Columns), 1, Most);

    /// <summary>First row of a stripe and the row after its last.</summary>
    public (int First, int End) this[int stripe] => (Boundary(stripe), Boundary(stripe + 1));

    private int Boundary(int stripe)
    {
        var blocks = (Rows + RowBlock.DefaultCapacity - 1) / RowBlock.DefaultCapacity;
        return (int)Math.Min(Rows, (long)blocks * stripe / Count * RowBlock.DefaultCapacity);
    }
}
