using System.Globalization;
using nietras.SeparatedValues;

namespace Auditor.Data;

/// <summary>
/// The first row of a delimited file: the column names, exactly as they stand. Names may be blank or stand twice (row numbers written by
/// another program often have no name); only a column that is asked for must have a name of its own.
/// </summary>
internal static class CsvHeader
{
    private const int Line = 1;

    public static Reading<IReadOnlyList<string>> Read(CsvFile file)
    {
        List<string> names = [];
        var problems = file.Pass(reader => reader.MoveNext() ? Take(file.Name, reader.Current, names) : [Empty(file.Name)]);
        return problems.Count == 0 ? Reading<IReadOnlyList<string>>.Of(names) : Reading<IReadOnlyList<string>>.Failed(problems);
    }

    private static List<Problem> Take(string file, SepReader.Row row, List<string> names)
    {
        for (var i = 0; i < row.ColCount; i++)
        {
            var field = row[i].Span;
            if (!QuotedField.IsWellFormed(field))
            {
                return [new Problem(file, Line, CsvRows.LooseMark(field))];
            }

            names.Add(QuotedField.Content(field).ToString());
        }

        return names is [""] ? [Empty(file)] : names is [var only] && OtherSeparator(only) is { } other ? [Unsplit(file, other)] : [];
    }

    /// <summary>One name with another usual separator in it: the file is separated by that.</summary>
    private static string? OtherSeparator(string name) =>
        name.Contains(';', StringComparison.Ordinal) ? "';'"
        : name.Contains('|', StringComparison.Ordinal) ? "'|'"
        : name.Contains('\t', StringComparison.Ordinal) ? "tabs"
        : name.Contains(',', StringComparison.Ordinal) ? "','"
        : null;

    private static Problem Unsplit(string file, string separator) => new(
        file, Line, $"the column names are separated by {separator}; a .csv file is separated by commas, a .tsv file by tabs");

    /// <summary>One problem for each wanted column that the header does not name exactly once.</summary>
    public static IReadOnlyList<Problem> Check(string file, IReadOnlyList<string> names, IEnumerable<string> wanted) =>
        [.. from column in wanted.Distinct(StringComparer.Ordinal)
            let places = Places(names, column)
            where places.Count != 1
            select new Problem(file, Line, places.Count == 0 ? $"column {column} is not in the header" : Repeated(column, places))];

    /// <summary>The positions of a name, 1-based.</summary>
    public static IReadOnlyList<int> Places(IReadOnlyList<string> names, string column) =>
        [.. Enumerable.Range(1, names.Count).Where(place => names[place - 1] == column)];

    public static string Repeated(string column, IReadOnlyList<int> places) =>
        $"the header names {CellText.Shown(column)} more than once, in columns {string.Join(" and ", places)}";

    /// <summary>A column as lists name it: a blank name would be lost in them.</summary>
    public static string Shown(string name, int index) => string.IsNullOrWhiteSpace(name)
        ? string.Create(CultureInfo.InvariantCulture, $"column {index + 1} (no name)")
        : name;

    private static Problem Empty(string file) => new(file, null, "found no text on the first line, expected the column names");
}
