using System.Globalization;
using Auditor.Data;
using Auditor.Declaration;
using Auditor.Yaml;

namespace Auditor.Starting;

/// <summary>Why a column is not taken as a term without a person's word.</summary>
/// <param name="Reason">In plain words.</param>
/// <param name="Kind">The kind to declare if the doubt is right; null when none would help.</param>
internal sealed record ColumnDoubt(string Reason, ColumnKind? Kind = null)
{
    /// <summary>More levels than this make more columns than anyone reads in a report. Our own choice, as are the next two.</summary>
    private const int MostLevels = 12;

    /// <summary>Whole numbers with so few values may be codes of something.</summary>
    private const int MostCodes = 12;

    private const double MostMissing = 0.5;

    private static readonly IReadOnlyList<Func<ColumnProfile, ColumnDoubt?>> _doubts =
    [
        column => column.Name == ColumnNames.Intercept ? new("the label of the constant; rename the column in the data to use it") : null,
        column => column.Missing == column.Rows ? new("no value in any row") : null,
        column => column.Texts.Count == 1 ? new($"the same value, {CellText.Shown(column.Texts[0])}, in every row that has one") : null,
        column => column.Missing > MostMissing * column.Rows ? new(Invariant($"no value in {column.Missing} of {column.Rows} rows")) : null,
        OddCells,
        column => column.Kind == ColumnKind.Date ? new($"dates: {{trend: {YamlText.Of(column.Name)}}} and {{season: {{of: {YamlText.Of(column.Name)}, by: quarter}}}} are terms") : null,
        column => column.NumbersTheRows ? new("a whole number of its own in every row, as a row number or a year has") : null,
        column => column.IsWhole && column.Texts.Any(IsPadded) ? new("numbers with leading zeros: codes?", ColumnKind.Levels) : null,
        column => column.IsWhole && column.Texts.Count is > 2 and <= MostCodes ? new(Invariant($"whole numbers with {column.Texts.Count} values: codes, or a count?"), ColumnKind.Levels) : null,
        column => column.Kind == ColumnKind.Levels && column.IsUnique ? new("a text of its own in every row, as a label has", ColumnKind.Text) : null,
        column => column.Kind == ColumnKind.Levels && column.Texts.Count > MostLevels ? new(Invariant($"{column.Texts.Count} different texts")) : null,
    ];

    /// <summary>The first doubt about a column, null when there is none.</summary>
    public static ColumnDoubt? Of(ColumnProfile column) => _doubts.Select(doubt => doubt(column)).FirstOrDefault(doubt => doubt is not null);

    private static ColumnDoubt? OddCells(ColumnProfile column)
    {
        if (column.Kind == ColumnKind.Levels || column.Odd.Count == 0)
        {
            return null;
        }

        var wanted = column.Kind == ColumnKind.Number ? "numbers" : "dates";
        return new(
            Invariant($"not all {wanted}: {Words.Or([.. column.Odd.Take(2).Select(text => CellText.Shown(text))])}; put it under missing if it means no value"),
            ColumnKind.Levels);
    }

    private static bool IsPadded(string text) => text.Length > 1 && text[0] == '0' && char.IsAsciiDigit(text[1]);

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
