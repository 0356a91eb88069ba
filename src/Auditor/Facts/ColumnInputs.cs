using Auditor.Data;

namespace Auditor.Facts;

/// <summary>What is known of one column of the source.</summary>
/// <param name="Kind">Null when the column was not read because nobody mentions it.</param>
/// <param name="FittedAsNumber">Whether a term of the final model or of a left-out group takes its plain value as a number.</param>
/// <param name="InTerm">Whether any term holds it.</param>
/// <param name="Distinct">Distinct values over the kept rows, counted up to <see cref="MostDistinct"/>; null when not read.</param>
/// <param name="WholeNumbers">Whether every value is a whole number.</param>
/// <param name="AbsentLevels">Declared levels that no kept row has.</param>
/// <param name="Line">Line of the declaration where it is first mentioned.</param>
public sealed record ColumnInputs(
    string Column,
    ColumnKind? Kind,
    bool FittedAsNumber,
    bool InTerm,
    int? Distinct,
    bool WholeNumbers,
    IReadOnlyList<string> AbsentLevels,
    int? Line)
{
    /// <summary>Beyond this many distinct values the count tells a rule nothing more.</summary>
    public const int MostDistinct = 1000;

    public static ColumnInputs NobodyMentions(string column) => new(column, null, false, false, null, false, [], null);

    /// <param name="rows">Rows, 0-based, that the filter and the weights leave.</param>
    /// <param name="declaredLevels">The levels the declaration lists, or null.</param>
    public static ColumnInputs Of(
        DataColumn column, IReadOnlyList<int> rows, bool fittedAsNumber, bool inTerm, IReadOnlyList<string>? declaredLevels, int? line) =>
        new(column.Name, column.Kind, fittedAsNumber, inTerm, CountDistinct(column, rows), IsWhole(column, rows), Absent(column, rows, declaredLevels), line);

    private static int CountDistinct(DataColumn column, IReadOnlyList<int> rows) => column switch
    {
        NumberColumn numbers => CountDistinct(rows.Where(row => !column.IsMissing(row)).Select(row => numbers.Values[row])),
        LevelsColumn levels => CountDistinct(rows.Where(row => !column.IsMissing(row)).Select(row => levels.Codes[row])),
        DateColumn dates => CountDistinct(rows.Where(row => !column.IsMissing(row)).Select(row => dates.Days[row])),
        _ => CountDistinct(rows.Select(column.Text).OfType<string>()),
    };

    private static int CountDistinct<T>(IEnumerable<T> values)
    {
        var seen = new HashSet<T>();
        foreach (var value in values)
        {
            if (seen.Add(value) && seen.Count == MostDistinct)
            {
                break;
            }
        }

        return seen.Count;
    }

    private static bool IsWhole(DataColumn column, IReadOnlyList<int> rows) =>
        column is NumberColumn numbers && rows.All(row => column.IsMissing(row) || double.IsInteger(numbers.Values[row]));

    private static IReadOnlyList<string> Absent(DataColumn column, IReadOnlyList<int> rows, IReadOnlyList<string>? declared)
    {
        if (declared is null || column is not LevelsColumn levels)
        {
            return [];
        }

        var present = rows.Select(row => levels.Codes[row]).Where(code => code >= 0).Distinct().Select(code => levels.Texts[code]);
        return [.. declared.Except(present, StringComparer.Ordinal)];
    }
}
