using System.Collections;
using System.Globalization;
using Auditor.Numerics.Storage;
using Microsoft.Data.Analysis;

namespace Auditor.Data;

/// <summary>
/// A data frame made in process as a source. Columns of numbers stay numbers (null and NaN are missing values, infinity is refused; 64-bit integers
/// and decimals are rounded to double), dates must have no time of day, and text is read by the same rules as the cells of a file.
/// </summary>
/// <param name="name">What messages call it.</param>
public sealed class DataFrameSource(string name, DataFrame frame) : IDataSource
{
    public Reading<IReadOnlyList<string>> ReadColumnNames() =>
        Reading<IReadOnlyList<string>>.Of([.. frame.Columns.Select(column => column.Name)]);

    public Reading<DataTable> Read(IReadOnlyList<ColumnRequest> columns, IReadOnlyList<string> missing)
    {
        var names = ReadColumnNames().Value!;
        var rows = checked((int)frame.Rows.Count);
        List<Problem> problems = rows > 0 ? [] : [new Problem(name, null, "found no data rows, expected at least one row")];
        problems.AddRange(columns.Where(column => !names.Contains(column.Column, StringComparer.Ordinal))
            .Select(column => new Problem(name, null, $"column {column.Column} is not in the data frame")));
        if (problems.Count > 0)
        {
            return Reading<DataTable>.Failed(problems);
        }

        var texts = new MissingTexts(missing);
        List<DataColumn> read = [.. columns.Select(column => Read(frame.Columns[column.Column], column, texts, problems))];
        return problems.Count > 0 ? Reading<DataTable>.Failed(problems) : Reading<DataTable>.Of(new DataTable(rows, names, read));
    }

    private DataColumn Read(DataFrameColumn column, ColumnRequest request, MissingTexts missing, List<Problem> problems)
    {
        if (column.IsNumericColumn() && (request.Kind ?? ColumnKind.Number) == ColumnKind.Number && !missing.HasNumbers)
        {
            return Numbers(column, request, problems);
        }

        var kind = request.Kind ?? Fill(column, request.Column, ColumnKind.Levels, missing).Counts.Kind;
        var builder = Fill(column, request.Column, kind, missing);
        problems.AddRange(builder.Problems(name));
        return builder.Build();
    }

    private NumberColumn Numbers(DataFrameColumn column, ColumnRequest request, List<Problem> problems)
    {
        var bad = new BadCells();
        var values = new double[checked((int)column.Length)];
        var row = 0;
        foreach (var cell in (IEnumerable)column)
        {
            values[row] = cell is null ? double.NaN : Convert.ToDouble(cell, CultureInfo.InvariantCulture);
            if (double.IsInfinity(values[row++]))
            {
                bad.Note(null, row, Text(cell));
            }
        }

        problems.AddRange(bad.Problems(name, request.Column, ColumnKind.Number));
        return new NumberColumn(request.Column, values);
    }

    private static ColumnBuilder Fill(DataFrameColumn column, string columnName, ColumnKind kind, MissingTexts missing)
    {
        var builder = ColumnBuilder.Of(kind, columnName, missing, CellStore.Memory);
        var rows = checked((int)column.Length);
        builder.Resize(rows);
        var part = builder.NextPart(0, rows);
        var row = 0;
        foreach (var cell in (IEnumerable)column)
        {
            if (Text(cell) is not { } text)
            {
                part.SetMissing(row);
            }
            else if (!part.Set(row, text))
            {
                part.Bad.Note(null, row + 1, text);
            }

            row++;
        }

        part.Close();
        return builder;
    }

    private static string? Text(object? cell) => cell switch
    {
        DateTime moment when moment.TimeOfDay == TimeSpan.Zero => moment.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture),
        double.NaN or float.NaN => null,
        _ => Convert.ToString(cell, CultureInfo.InvariantCulture),
    };
}
