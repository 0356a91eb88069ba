namespace Auditor.Data;

/// <summary>How large a table will be, as far as it is known before it is read.</summary>
/// <param name="Rows">About so many rows; 0 when that is not known.</param>
/// <param name="Kinds">The kind of each column, as the first rows have it.</param>
public sealed record TableSize(long Rows, IReadOnlyList<ColumnKind> Kinds)
{
    /// <summary>Room for a short text and what points at it.</summary>
    private const long TextBytes = 56;

    /// <summary>Bytes of one row in memory.</summary>
    public long RowBytes => Kinds.Sum(kind => kind switch
    {
        ColumnKind.Number => sizeof(double),
        ColumnKind.Text => TextBytes,
        _ => sizeof(int),
    });
}
