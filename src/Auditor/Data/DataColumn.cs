namespace Auditor.Data;

/// <summary>One column of a table, n cells, its kind decided.</summary>
public abstract class DataColumn(string name)
{
    public string Name { get; } = name;

    public abstract ColumnKind Kind { get; }

    /// <summary>Number of rows n.</summary>
    public abstract int Length { get; }

    public abstract bool IsMissing(int row);

    /// <summary>The cell as text, null when missing; for filters, labels and messages, not for arithmetic.</summary>
    public abstract string? Text(int row);
}
