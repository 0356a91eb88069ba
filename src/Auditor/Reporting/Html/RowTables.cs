using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>Where every row of the source went.</summary>
internal static class RowTables
{
    public static ReportTable Account(RowAccount rows) => ReportTable.Of(
        "Every row of the source",
        new (string Where, int Count)[]
        {
            ("Filtered out by the declaration", rows.FilteredOut),
            ("Of weight zero", rows.ZeroWeight),
            ("Incomplete: a value is missing", rows.Incomplete),
            ("Undefined: a transform has no value", rows.Undefined),
            ("Used", rows.Used),
            ("Read from the source, the sum of these", rows.Read),
        },
        new("Where it went", "text", line => Cell.Words(line.Where)),
        new("Rows", "number", line => Cell.Count(line.Count)));

    public static ReportTable Missing(RowAccount rows) => Counted("Missing values by column", "Column", "Missing", rows.MissingByColumn);

    public static ReportTable Undefined(RowAccount rows) => Counted("Rows where a term has no value although its columns do", "Term", "Rows", rows.UndefinedByTerm);

    private static ReportTable Counted(string caption, string what, string count, IReadOnlyDictionary<string, int> counts) => ReportTable.Of(
        caption,
        counts,
        new(what, "name", pair => Cell.Name(pair.Key)),
        new(count, "number", pair => Cell.Count(pair.Value)));
}
