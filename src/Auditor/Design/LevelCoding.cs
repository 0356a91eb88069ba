using System.Globalization;
using Auditor.Data;
using Auditor.Declaration;
using Auditor.Yaml;

namespace Auditor.Design;

/// <summary>
/// The levels of a column that the kept rows have, in order, the first the reference: declared order when declared, else by value when all are numbers, else
/// by code point; a declared reference goes to the front. Fixed once, whatever rows are used later.
/// </summary>
/// <param name="Levels">At least one unless there is a problem.</param>
/// <param name="Known">The levels that may be named: the declared ones, or those of the kept rows.</param>
internal sealed record LevelCoding(
    IReadOnlyList<string> Levels, IReadOnlyList<string> Known, IReadOnlyList<string> Problems, IReadOnlyList<BindingNote> Notes)
{
    public static LevelCoding Of(LevelsColumn column, ColumnDeclaration? declared, RowSubset keptRows)
    {
        var firstRows = FirstRows(column, keptRows);
        var texts = firstRows.Keys.ToList();
        IReadOnlyList<string> known = declared?.Levels ?? [.. CodePointOrder.Sort(texts)];
        var levels = known.Where(firstRows.ContainsKey).ToList();
        List<string> problems = [.. Undeclared(column.Name, declared?.Levels, firstRows), .. UnknownReference(column.Name, declared, known)];
        if (texts.Count == 0)
        {
            problems.Add($"column {column.Name} has no value on the kept rows");
        }

        if (declared?.Reference is { } reference && levels.Remove(reference))
        {
            levels.Insert(0, reference);
        }

        return new LevelCoding(levels, known, problems, Remarks(column.Name, known, levels));
    }

    /// <summary>The dummy column of each code of the data column: negative for the reference and for levels that no kept row has.</summary>
    public int[] ColumnOfCode(LevelsColumn column)
    {
        var place = Levels.Select((level, index) => (level, index)).ToDictionary(pair => pair.level, pair => pair.index - 1, StringComparer.Ordinal);
        return [.. column.Texts.Select(text => place.GetValueOrDefault(text, -1))];
    }

    /// <summary>The texts that kept rows have, each with the first row (1-based) that has it.</summary>
    private static Dictionary<string, int> FirstRows(LevelsColumn column, RowSubset keptRows)
    {
        var first = new int[column.Texts.Count];
        foreach (var row in keptRows)
        {
            if (column.Codes[row] is >= 0 and var code && first[code] == 0)
            {
                first[code] = row + 1;
            }
        }

        return column.Texts.Zip(first).Where(pair => pair.Second > 0).ToDictionary(pair => pair.First, pair => pair.Second, StringComparer.Ordinal);
    }

    private static IEnumerable<string> Undeclared(string column, IReadOnlyList<string>? levels, Dictionary<string, int> firstRows) =>
        levels is null
            ? []
            : from pair in firstRows
              where !levels.Contains(pair.Key)
              orderby pair.Value
              select string.Create(
                  CultureInfo.InvariantCulture,
                  $"row {pair.Value}, column {column}: found {CellText.Shown(pair.Key)}, expected one of the declared levels{NearestName.Hint(pair.Key, levels)}");

    private static IEnumerable<string> UnknownReference(string column, ColumnDeclaration? declared, IReadOnlyList<string> known) =>
        declared?.Reference is { } reference && !known.Contains(reference)
            ? [$"the reference {CellText.Shown(reference)} is not a level that column {column} has on the kept rows{NearestName.Hint(reference, known)}"]
            : [];

    private static List<BindingNote> Remarks(string column, IReadOnlyList<string> known, List<string> levels) =>
    [
        .. known.Except(levels, StringComparer.Ordinal).Select(level => new LevelWithoutRows(column, level)),
        .. levels is [var only] ? new BindingNote[] { new SingleLevel(column, only) } : [],
    ];
}
