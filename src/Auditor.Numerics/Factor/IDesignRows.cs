namespace Auditor.Numerics.Factor;

/// <summary>
/// The rows of one row set, delivered block by block, in the same order every time. Columns: the final model's (the intercept
/// first when there is one), then each group's, the response last.
/// </summary>
public interface IDesignRows
{
    DesignLayout Layout { get; }

    /// <summary>
    /// Into how many stripes of consecutive rows the row set is cut, so that several threads may work on one factor. It depends on the rows and columns
    /// alone, never on the threads: the stripes' factors are merged in order, and the same stripes give the same bits.
    /// </summary>
    int Stripes => 1;

    /// <summary>
    /// The same rows with the low parts of the columns that the source forms itself, for a factor in extended precision when digits are lost. Null: the factor stays
    /// as it is.
    /// </summary>
    IDesignRows? Extended => null;

    IEnumerable<RowBlock> Blocks();

    /// <summary>The blocks of one stripe; several stripes may be read at the same time. A design of more than one stripe must give its own.</summary>
    IEnumerable<RowBlock> Blocks(int stripe) => Blocks();
}

/// <summary>A run of columns of the design.</summary>
public readonly record struct ColumnRange(int Start, int Count)
{
    public IEnumerable<int> Indices => Enumerable.Range(Start, Count);
}

/// <summary>Which columns of the design are the final model's, which are each group's; the response is the last column.</summary>
/// <param name="Intercept">Column 0 is a column of ones.</param>
/// <param name="FinalColumns">Columns of the final model, the intercept included.</param>
public sealed record DesignLayout(bool Intercept, int FinalColumns, IReadOnlyList<ColumnRange> Groups)
{
    /// <summary>All columns, the response included.</summary>
    public int Columns => FinalColumns + Groups.Sum(group => group.Count) + 1;

    public int Response => Columns - 1;
}
