using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;

namespace Auditor.Tests.Design;

/// <summary>Tables and declarations that stand in the test.</summary>
internal static class Binding
{
    public const string Model = "model.yaml";

    public static readonly ColumnTerm Age = new("age");
    public static readonly ColumnTerm Price = new("price");
    public static readonly ColumnTerm Region = new("region");
    public static readonly ColumnTerm Opened = new("opened");

    public static DataTable Table(params DataColumn[] columns) => new(columns[0].Length, [.. columns.Select(column => column.Name)], columns);

    public static NumberColumn Numbers(string name, params double[] values) => new(name, values);

    public static LevelsColumn Levels(string name, params string?[] cells)
    {
        var texts = cells.OfType<string>().Distinct(StringComparer.Ordinal).ToList();
        return new LevelsColumn(name, [.. cells.Select(cell => cell is null ? -1 : texts.IndexOf(cell))], texts);
    }

    public static DateColumn Dates(string name, params string?[] cells) =>
        new(name, [.. cells.Select(cell => cell is null ? DateColumn.Missing : DateOnly.Parse(cell, System.Globalization.CultureInfo.InvariantCulture).DayNumber)]);

    public static int[] AllRows(DataTable table) => [.. Enumerable.Range(0, table.RowCount)];

    /// <summary>Terms that look back do so in the file's own order.</summary>
    public static TermBinder Binder(DataTable table, int[]? keptRows = null, Period? period = null, params ColumnDeclaration[] declared) =>
        new(table, new RowSubset(keptRows ?? AllRows(table)), declared.ToDictionary(column => column.Column), period, Model, new TimeOrder(TimeAxis.OfFileOrder(table.RowCount, null), null, 4));

    public static BoundTerm Bind(DataTable table, Term term, int[]? keptRows = null, Period? period = null, params ColumnDeclaration[] declared)
    {
        var reading = Binder(table, keptRows, period, declared).Bind(term);
        Assert.Empty(reading.Problems);
        return reading.Value!;
    }

    public static string[] Refused(DataTable table, Term term, params ColumnDeclaration[] declared)
    {
        var reading = Binder(table, null, null, declared).Bind(term);
        Assert.Null(reading.Value);
        return [.. reading.Problems.Select(problem => problem.ToString())];
    }

    /// <summary>The columns of a term on the given rows, all rows of the first source when none are given.</summary>
    public static double[][] Columns(this BoundTerm term, int[]? rows = null)
    {
        rows ??= [.. Enumerable.Range(0, term.Sources[0].Length)];
        var into = new double[term.ColumnLabels.Count * rows.Length];
        term.Fill(rows, into, rows.Length);
        return [.. into.Chunk(Math.Max(rows.Length, 1))];
    }
}
