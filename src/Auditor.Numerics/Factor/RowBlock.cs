namespace Auditor.Numerics.Factor;

/// <summary>
/// Some consecutive rows of a design: column-major values as declared (not shifted, not weighted), with the weights of the rows.
/// Column c, row i stands at <c>Values[c * Stride + i]</c>. A source may reuse one block for all its rows.
/// </summary>
public sealed class RowBlock(int capacity, int columns)
{
    /// <summary>Rows per block that keep a block of some tens of columns in the cache nearest to the processor.</summary>
    public const int DefaultCapacity = 256;

    public double[] Values { get; } = new double[capacity * columns];

    /// <summary>What rounding took off each value, laid out as <see cref="Values"/>: value plus low part is the number that was declared. Null: nothing is known.</summary>
    public double[]? Low { get; set; }

    public int Stride { get; } = capacity;

    public int Columns { get; } = columns;

    /// <summary>Rows in use, at most <see cref="Stride"/>.</summary>
    public int Rows { get; set; }

    /// <summary>0-based position of the first row within the row set.</summary>
    public int FirstRow { get; set; }

    /// <summary>Weight w of each row (the row enters times sqrt(w)), null when all are one.</summary>
    public double[]? Weights { get; set; }

    /// <summary>How many equal rows each row stands for, null when all are one.</summary>
    public double[]? Copies { get; set; }

    public Span<double> Column(int column) => Values.AsSpan(column * Stride, Rows);

    /// <summary>Low parts of a column; empty when nothing is known.</summary>
    public Span<double> LowColumn(int column) => Low is null ? [] : Low.AsSpan(column * Stride, Rows);
}
