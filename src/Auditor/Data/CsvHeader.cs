using System.Globalization;
using nietras.SeparatedValues;

namespace Auditor.Data;

/// <summary>The first row of a delimited file: the column names, exactly as they stand.</summary>
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

        return names is [""] ? [Empty(file)] : [.. Nameless(file, names), .. Repeated(file, names)];
    }

    private static Problem Empty(string file) => new(file, null, "found no text on the first line, expected the column names");

    private static IEnumerable<Problem> Nameless(string file, List<string> names) =>
        from index in Enumerable.Range(0, names.Count)
        where string.IsNullOrWhiteSpace(names[index])
        select new Problem(file, Line, string.Create(CultureInfo.InvariantCulture, $"column {index + 1} of {names.Count} has no name in the header"));

    private static IEnumerable<Problem> Repeated(string file, List<string> names) =>
        from index in Enumerable.Range(0, names.Count)
        where !string.IsNullOrWhiteSpace(names[index])
        group index + 1 by names[index] into places
        where places.Count() > 1
        select new Problem(file, Line, $"the header names {CellText.Shown(places.Key)} more than once, in columns {string.Join(" and ", places)}");
}
