namespace Auditor.Data;

/// <summary>The columns an audit needs, in memory, with the names of all columns of the source.</summary>
public sealed class DataTable
{
    private readonly Dictionary<string, DataColumn> _byName;

    /// <param name="sourceColumns">Every column name of the source, in order.</param>
    /// <param name="columns">The columns that were asked for, all of <paramref name="rowCount"/> cells.</param>
    public DataTable(int rowCount, IReadOnlyList<string> sourceColumns, IReadOnlyList<DataColumn> columns)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(rowCount);
        if (columns.FirstOrDefault(column => column.Length != rowCount) is { } odd)
        {
            throw new ArgumentException($"column {odd.Name} does not have one cell a row", nameof(columns));
        }

        RowCount = rowCount;
        SourceColumns = sourceColumns;
        Columns = columns;
        _byName = columns.ToDictionary(column => column.Name, StringComparer.Ordinal);
    }

    public int RowCount { get; }

    public IReadOnlyList<string> SourceColumns { get; }

    public IReadOnlyList<DataColumn> Columns { get; }

    /// <summary>The column of that name; it is an error of the caller to ask for one that was not read.</summary>
    public DataColumn this[string name] => _byName[name];
}
