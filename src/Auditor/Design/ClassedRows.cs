using Auditor.Data;
using Auditor.Numerics.SecondPass;

namespace Auditor.Design;

/// <summary>Every row of a table sorted into classes by the value of a column or the period it lies in; made once, then cut down to the rows of a fit.</summary>
public sealed class ClassedRows
{
    private readonly int[] _codes;
    private readonly int[] _firstRows;
    private readonly Func<int, string> _label;

    private ClassedRows(string name, int[] codes, int[] firstRows, Func<int, string> label) =>
        (Name, _codes, _firstRows, _label) = (name, codes, firstRows, label);

    /// <summary>The column, or what stands in its place.</summary>
    public string Name { get; }

    /// <summary>Classes in the table.</summary>
    public int Count => _firstRows.Length;

    /// <summary>Classes by the values of a column, in the order of the values.</summary>
    public static ClassedRows Of(DataColumn column) => Of(column.Name, ColumnKeys.Of(column), row => column.Text(row)!);

    /// <param name="keys">One a row; rows with equal keys share a class, classes stand in rising order; NaN: the row has no class.</param>
    /// <param name="label">What to call the class of a row.</param>
    internal static ClassedRows Of(string name, double[] keys, Func<int, string> label)
    {
        var firstRow = new Dictionary<double, int>();
        for (var row = 0; row < keys.Length; row++)
        {
            if (!double.IsNaN(keys[row]))
            {
                firstRow.TryAdd(keys[row], row);
            }
        }

        double[] distinct = [.. firstRow.Keys.Order()];
        var place = distinct.Index().ToDictionary(pair => pair.Item, pair => pair.Index);
        return new ClassedRows(
            name, [.. keys.Select(key => double.IsNaN(key) ? -1 : place[key])], [.. distinct.Select(key => firstRow[key])], label);
    }

    /// <summary>The class of a row of the table, 0 to Count - 1, in order; -1 when it has none.</summary>
    public int this[int row] => _codes[row];

    public string Label(int code) => _label(_firstRows[code]);

    /// <summary>The classes that some rows have, numbered anew from 0 in the same order.</summary>
    public RowGroups Among(RowSubset rows)
    {
        var present = new bool[Count];
        foreach (var row in rows)
        {
            if (_codes[row] is >= 0 and var code)
            {
                present[code] = true;
            }
        }

        int[] kept = [.. Enumerable.Range(0, Count).Where(code => present[code])];
        var anew = new int[Count];
        foreach (var (code, old) in kept.Index())
        {
            anew[old] = code;
        }

        return new RowGroups(Name, [.. rows.Select(row => _codes[row] < 0 ? -1 : anew[_codes[row]])], kept.Length, code => Label(kept[code]));
    }
}

/// <summary>The rows of a fit sorted into classes that have names.</summary>
/// <param name="Name">The column they come from.</param>
/// <param name="Codes">One a row of the subset, 0 to Count - 1. The rows of a fit have one each: a row without a cluster, unit or time is incomplete. Only a segment can be -1, no value.</param>
/// <param name="Label">What to call a class.</param>
public sealed record RowGroups(string Name, IReadOnlyList<int> Codes, int Count, Func<int, string> Label)
{
    /// <summary>The codes as the second pass reads them.</summary>
    public RowClasses Classes => new([.. Codes], Count);

    /// <summary>Rows in each class.</summary>
    public int[] Sizes()
    {
        var sizes = new int[Count];
        foreach (var code in Codes)
        {
            if (code >= 0)
            {
                sizes[code]++;
            }
        }

        return sizes;
    }
}
