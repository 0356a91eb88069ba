namespace Auditor.Numerics.Factor;

/// <summary>A small dense column-major matrix, so that a column is one span.</summary>
public sealed class ColumnMatrix(int rows, int columns)
{
    private readonly double[] _values = new double[rows * columns];

    public int Rows { get; } = rows;

    public int Columns { get; } = columns;

    /// <summary>All entries, column after column.</summary>
    internal ReadOnlySpan<double> Values => _values;

    public double this[int row, int column]
    {
        get => _values[(column * Rows) + row];
        set => _values[(column * Rows) + row] = value;
    }

    public Span<double> Column(int column) => _values.AsSpan(column * Rows, Rows);

    internal ReadOnlyMemory<double> ColumnMemory(int column) => _values.AsMemory(column * Rows, Rows);

    /// <summary>The given columns, in that order, copied.</summary>
    public ColumnMatrix Select(IReadOnlyList<int> columns) => Select(columns, 0, Rows);

    /// <summary>Some rows of the given columns, in that order, copied.</summary>
    public ColumnMatrix Select(IReadOnlyList<int> columns, int first, int count)
    {
        var selected = new ColumnMatrix(count, columns.Count);
        for (var c = 0; c < columns.Count; c++)
        {
            Column(columns[c]).Slice(first, count).CopyTo(selected.Column(c));
        }

        return selected;
    }
}
