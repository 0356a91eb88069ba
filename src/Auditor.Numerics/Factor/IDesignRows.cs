namespace Auditor.Numerics.Factor;

/// <summary>
/// The rows of one row set, delivered block by block, in the same order every time. Columns: the final model's (the intercept
/// first when there is one), then each group's, the response last.
/// </summary>
public interface IDesignRows
{
    DesignLayout Layout { get; }

    IEnumerable<RowBlock> Blocks();
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
