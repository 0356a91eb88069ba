namespace Auditor.Data;

/// <summary>A place that rows come from. Everything downstream sees the table only.</summary>
public interface IDataSource
{
    /// <summary>The column names in order, or the problems that keep them from being read.</summary>
    Reading<IReadOnlyList<string>> ReadColumnNames();

    /// <summary>Reads the requested columns; every unreadable cell of theirs is a problem (the first ones in full, the rest counted).</summary>
    Reading<DataTable> Read(IReadOnlyList<ColumnRequest> columns, IReadOnlyList<string> missing);
}

/// <summary>A column to be read. A null kind is inferred from its cells.</summary>
public sealed record ColumnRequest(string Column, ColumnKind? Kind);
