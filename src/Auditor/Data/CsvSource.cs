namespace Auditor.Data;

/// <summary>
/// A table in a delimited text file (RFC 4180, UTF-8 with or without byte order mark, first row the names). Only the requested columns are parsed.
/// The kind of a column follows from all its cells: the first rows give a guess, one pass fills every column by it while counting, and a column
/// that was guessed wrong is read again.
/// </summary>
/// <param name="name">The file as the person named it, for messages.</param>
/// <param name="open">Opens the bytes as stored; called once for each pass.</param>
public sealed class CsvSource(string name, Func<Stream> open, DelimitedFormat format) : IDataSource
{
    private const int SampleRows = 1000;

    private readonly CsvFile _file = new(name, open, format);

    public Reading<IReadOnlyList<string>> ReadColumnNames() => CsvHeader.Read(_file);

    public Reading<DataTable> Read(IReadOnlyList<ColumnRequest> columns, IReadOnlyList<string> missing)
    {
        var header = ReadColumnNames();
        if (header.Value is not { } names)
        {
            return Reading<DataTable>.Failed(header.Problems);
        }

        var problems = CsvHeader.Check(name, names, columns.Select(column => column.Column));
        return problems.Count == 0 ? Read(names, columns, new MissingTexts(missing)) : Reading<DataTable>.Failed(problems);
    }

    private Reading<DataTable> Read(IReadOnlyList<string> names, IReadOnlyList<ColumnRequest> requests, MissingTexts missing)
    {
        var sample = Sample(names, requests, missing);
        var pass = Pass(names, [.. requests.Zip(sample.Kinds, (request, kind) => (request.Column, kind))], missing, sample.ExpectedRows);
        if (pass.Rows.Count == 0 && pass.Problems.Count == 0)
        {
            return Reading<DataTable>.Failed(new Problem(name, null, "found column names and no data rows, expected at least one row"));
        }

        var builders = Corrected(names, requests, missing, pass);
        IReadOnlyList<Problem> problems = [.. pass.Problems, .. builders.SelectMany(builder => builder.Bad.Problems(name, builder.Name, builder.Kind))];
        return problems.Count == 0
            ? Reading<DataTable>.Of(new DataTable(pass.Rows.Count, names, [.. builders.Select(builder => builder.Build())]))
            : Reading<DataTable>.Failed(problems);
    }

    /// <summary>Reads the first rows as text for a guess of each column's kind and of the number of rows. Its problems come again in the full pass.</summary>
    private (ColumnKind[] Kinds, int ExpectedRows) Sample(IReadOnlyList<string> names, IReadOnlyList<ColumnRequest> requests, MissingTexts missing)
    {
        var pass = Pass(names, [.. requests.Select(request => (request.Column, ColumnKind.Levels))], missing, SampleRows, SampleRows);
        var kinds = requests.Zip(pass.Builders, (request, builder) => request.Kind ?? builder.Counts.Kind);
        return ([.. kinds], pass.Rows.Count < SampleRows ? pass.Rows.Count : RowEstimate(pass.Rows));
    }

    private int RowEstimate(CsvRows sample) =>
        _file.Length() is long length ? (int)Math.Min(length * 1.02 * sample.Count / sample.Characters, Array.MaxLength) : 1 << 16;

    /// <summary>The builders, those of undeclared columns whose cells turned out to be of another kind than guessed replaced by right ones.</summary>
    private List<ColumnBuilder> Corrected(IReadOnlyList<string> names, IReadOnlyList<ColumnRequest> requests, MissingTexts missing, FullPass pass)
    {
        var wrong = requests.Zip(pass.Builders)
            .Where(pair => pair.First.Kind is null && pair.Second.Counts.Kind != pair.Second.Kind)
            .Select(pair => (pair.Second.Name, pair.Second.Counts.Kind)).ToList();
        if (wrong.Count == 0)
        {
            return pass.Builders;
        }

        var again = Pass(names, wrong, missing, pass.Rows.Count).Builders.ToDictionary(builder => builder.Name, StringComparer.Ordinal);
        return [.. pass.Builders.Select(builder => again.GetValueOrDefault(builder.Name, builder))];
    }

    private FullPass Pass(
        IReadOnlyList<string> names, List<(string Column, ColumnKind Kind)> columns, MissingTexts missing, int expectedRows, int most = int.MaxValue)
    {
        List<ColumnBuilder> builders = [.. columns.Select(column => ColumnBuilder.Of(column.Kind, column.Column, missing, expectedRows))];
        var rows = new CsvRows(name, names.Count, [.. columns.Select(column => CsvHeader.Places(names, column.Column)[0] - 1)], builders);
        return new FullPass(builders, rows, _file.Pass(reader => rows.Read(reader, most)));
    }

    private sealed record FullPass(List<ColumnBuilder> Builders, CsvRows Rows, IReadOnlyList<Problem> Problems);
}
