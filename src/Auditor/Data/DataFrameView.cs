using Microsoft.Data.Analysis;

namespace Auditor.Data;

/// <summary>
/// A table seen as a data frame of Microsoft.Data.Analysis. Number columns stand on the table's own arrays (a missing value, NaN there, is null
/// here): do not write to the frame. Columns of other kinds are copied as text.
/// </summary>
public static class DataFrameView
{
    /// <summary>The longest column that one buffer of a frame can stand on: its length in bytes is an int.</summary>
    public const int MostRows = int.MaxValue / sizeof(double);

    public static DataFrame Of(DataTable table)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(table.RowCount, MostRows, nameof(table));
        return new DataFrame(table.Columns.Select(Column));
    }

    private static DataFrameColumn Column(DataColumn column) =>
        column is NumberColumn numbers ? Wrapped(numbers) : new StringDataFrameColumn(column.Name, Enumerable.Range(0, column.Length).Select(column.Text));

    private static DoubleDataFrameColumn Wrapped(NumberColumn column)
    {
        var values = column.Values.ToArray();
        var (validity, missing) = Validity(values);
        return new DoubleDataFrameColumn(column.Name, new ArrayBytes(values).Memory, validity, column.Length, missing);
    }

    /// <summary>One bit a row, lowest first, 1 where there is a value; and the number of rows without one.</summary>
    private static (byte[] Bits, int Missing) Validity(double[] values)
    {
        var bits = new byte[(values.Length + 7) / 8];
        var missing = 0;
        for (var i = 0; i < values.Length; i++)
        {
            var isValue = !double.IsNaN(values[i]);
            bits[i >> 3] |= (byte)((isValue ? 1 : 0) << (i & 7));
            missing += isValue ? 0 : 1;
        }

        return (bits, missing);
    }
}
