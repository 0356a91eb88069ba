using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>
/// Which columns of a design have one value only within each class (values as declared, compared exactly). Where every class is one row, nothing can be said to be
/// constant within one: a column is observed row by row then.
/// </summary>
internal sealed class ColumnLevels
{
    private readonly RowClasses _classes;
    private readonly Dictionary<int, double[]> _constant = [];

    public ColumnLevels(RowClasses classes, IEnumerable<int> columns)
    {
        _classes = classes;
        foreach (var column in classes.Count == classes.Codes.Length ? [] : columns)
        {
            _constant[column] = NotSeen(classes.Count);
        }
    }

    /// <summary>How many of the columns have one value only within each class.</summary>
    public int Constant(IEnumerable<int> columns) => columns.Count(_constant.ContainsKey);

    public void Add(RowBlock block)
    {
        foreach (var (column, values) in _constant.ToArray())
        {
            // A column found to vary is not looked at again, and its memory is given back.
            if (!Agrees(block, column, values))
            {
                _constant.Remove(column);
            }
        }
    }

    /// <summary>NaN, which no cell of a design is.</summary>
    private static double[] NotSeen(int count)
    {
        var values = new double[count];
        Array.Fill(values, double.NaN);
        return values;
    }

    private bool Agrees(RowBlock block, int column, double[] values)
    {
        var codes = _classes.Codes.Slice(block.FirstRow, block.Rows);
        var cells = block.Column(column);
        for (var i = 0; i < cells.Length; i++)
        {
            ref var value = ref values[codes[i]];
            value = double.IsNaN(value) ? cells[i] : value;
            if (!value.Equals(cells[i]))
            {
                return false;
            }
        }

        return true;
    }
}
