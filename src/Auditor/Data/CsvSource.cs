using Auditor.Numerics.Storage;

namespace Auditor.Data;

/// <summary>
/// A table in a delimited text file (RFC 4180, UTF-8 with or without byte order mark, first row the names). Only the requested columns are parsed.
/// The kind of a column follows from all its cells: the first rows give a guess, one pass fills every column by it while counting, and a column
/// that was guessed wrong is read again.
/// </summary>
/// <param name="name">The file as the person named it, for messages.</param>
/// <param name="open">Opens the bytes as stored; called once for each pass.</param>
public sealed class CsvSource(string name, Func<Stream> open, DelimitedFormat format, CsvReading? reading = null) : IDataSource
{
    private const int SampleBytes = 1 << 18;

    private readonly CsvFile _file = new(name, open, format);
    private readonly CsvReading _reading = reading ?? new CsvReading();

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
        var (kinds, rows) = Guesses(names, requests, missing);
        var store = _reading.Store(new TableSize(_reading.Rows > 0 ? _reading.Rows : rows, kinds));
        var pass = Pass(names, [.. requests.Zip(kinds, (request, kind) => (request.Column, kind))], missing, _reading, store);
        if (pass.Rows == 0 && pass.Problems.Count == 0)
        {
            return Reading<DataTable>.Failed(new Problem(name, null, "found column names and no data rows, expected at least one row"));
        }

        var builders = Corrected(names, requests, missing, pass, store);
        IReadOnlyList<Problem> problems = [.. pass.Problems, .. builders.SelectMany(builder => builder.Problems(name))];
        return problems.Count == 0
            ? Reading<DataTable>.Of(new DataTable(pass.Rows, names, [.. builders.Select(builder => builder.Build())]))
            : Reading<DataTable>.Failed(problems);
    }

    /// <summary>The kinds that the first rows have, and about how many rows there are. Problems among them come again in the full pass.</summary>
    private (List<ColumnKind> Kinds, long Rows) Guesses(IReadOnlyList<string> names, IReadOnlyList<ColumnRequest> requests, MissingTexts missing)
    {
        var sample = Pass(names, [.. requests.Select(request => (request.Column, ColumnKind.Levels))], missing, new CsvReading(ChunkBytes: SampleBytes), CellStore.Memory, most: 1);
        return ([.. requests.Zip(sample.Builders, (request, builder) => request.Kind ?? builder.Counts.Kind)], (long)sample.Expected);
    }

    /// <summary>The builders, those of undeclared columns whose cells turned out to be of another kind than guessed replaced by right ones.</summary>
    private List<ColumnBuilder> Corrected(IReadOnlyList<string> names, IReadOnlyList<ColumnRequest> requests, MissingTexts missing, FullPass pass, CellStore store)
    {
        var wrong = requests.Zip(pass.Builders)
            .Where(pair => pair.First.Kind is null && pair.Second.Counts.Kind != pair.Second.Kind)
            .Select(pair => (pair.Second.Name, pair.Second.Counts.Kind)).ToList();
        if (wrong.Count == 0)
        {
            return pass.Builders;
        }

        var again = Pass(names, wrong, missing, _reading with { Rows = pass.Rows }, store).Builders.ToDictionary(builder => builder.Name, StringComparer.Ordinal);
        return [.. pass.Builders.Select(builder => again.GetValueOrDefault(builder.Name, builder))];
    }

    private FullPass Pass(
        IReadOnlyList<string> names, List<(string Column, ColumnKind Kind)> columns, MissingTexts missing, CsvReading how, CellStore store, int most = int.MaxValue)
    {
        List<ColumnBuilder> builders = [.. columns.Select(column => ColumnBuilder.Of(column.Kind, column.Column, missing, store))];
        var pass = new CsvPass(_file, names.Count, [.. columns.Select(column => CsvHeader.Places(names, column.Column)[0] - 1)], builders, how);
        var problems = pass.Run(most);
        return new FullPass(builders, pass.Rows, pass.Expected, problems);
    }

    private sealed record FullPass(List<ColumnBuilder> Builders, int Rows, double Expected, IReadOnlyList<Problem> Problems);
}
