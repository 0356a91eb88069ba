using Auditor.Data;

namespace Auditor.Facts;

/// <summary>The facts of one column of the source.</summary>
public static class ColumnFacts
{
    private static readonly FactFamily<ColumnInputs> Family = new FactFamily<ColumnInputs>(About.Column)
        .Text("column", "Name of the column.", column => column.Column)
        .Flag("mentioned", "The declaration names it somewhere.", column => column.Kind is not null)
        .Word("kind", "What its cells are.", FactWords.Kinds, Kind, NotRead)
        .Flag("in_term", "A term of the final model or of a left-out group holds it.", column => column.InTerm)
        .Flag("fitted_as_number", "A term takes its plain value as a number.", column => column.FittedAsNumber)
        .Count("distinct_values", "values", "Distinct values over the kept rows (counted up to 1,000).", column => column.Distinct, NotRead)
        .Flag("one_value", "All kept rows with a value have the same one.", column => column.Distinct is int distinct ? distinct == 1 : null, NotRead)
        .Flag("whole_numbers", "Every value is a whole number.", column => column.WholeNumbers)
        .Flag("has_absent_levels", "A declared level is in no kept row.", column => column.AbsentLevels.Count > 0)
        .Text("absent_levels", "Those levels.", column => string.Join(", ", column.AbsentLevels));

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(ColumnInputs column) => Family.From(column, column.Column, column.Line);

    private static string? Kind(ColumnInputs column) => column.Kind switch
    {
        ColumnKind.Number => "number",
        ColumnKind.Levels => "levels",
        ColumnKind.Date => "date",
        ColumnKind.Text => "text",
        _ => null,
    };

    private static string NotRead(ColumnInputs column) => "the column was not read: nobody mentions it";
}
