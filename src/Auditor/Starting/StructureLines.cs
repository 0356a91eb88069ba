using System.Globalization;

namespace Auditor.Starting;

/// <summary>
/// What a first declaration proposes about dependence between rows, parts of them and weights: a key, its most likely value and when it is needed.
/// All of it stands there as comments: nothing in the data can tell what depends on what.
/// </summary>
internal static class StructureLines
{
    /// <summary>A column with fewer values is no unit worth naming: a test over so few clusters can reject next to nothing. Our own choice.</summary>
    private const int FewestUnits = 6;

    /// <summary>The shipped policy divides by no column with more values.</summary>
    private const int MostSegments = 12;

    private static readonly string[] _weightWords = ["weight", "exposure"];

    public static IReadOnlyList<(string Text, string Note)> Of(IReadOnlyList<ColumnProfile> columns)
    {
        var time = TimeGuess.Of(columns);
        var units = Named(columns.Where(column => IsGrouping(column) && column.Texts.Count >= FewestUnits).MaxBy(column => column.Texts.Count));
        var segments = Named(columns.Where(column => IsGrouping(column) && column.Texts.Count <= MostSegments).MinBy(column => column.Texts.Count));
        var weights = Named(columns.FirstOrDefault(IsWeight));
        return
        [
            ("time: " + YamlText.Of(time?.Column ?? "opened"), "when rows near in time may move together: a column of dates, or of numbers that step by 1"),
            .. Step(time),
            ("unit: " + (units ?? "dealer"), "when the same dealer, contract or machine is observed again and again: time runs within it"),
            ("cluster: " + (units ?? "dealer"), "when rows that share it may move together; it must hold each unit whole"),
            (Split(time, columns), "when the model may have changed at a known point: asks for a Chow test"),
            ($"segments: [{segments ?? "region"}]", "when the model is used for parts by themselves: every group is tested in each"),
            ($"weights: {{column: {weights ?? "exposure"}, kind: precision}}", "when the model was fitted with weights; kind is precision, frequency or sampling"),
        ];
    }

    private static IEnumerable<(string Text, string Note)> Step(TimeGuess? time) =>
        time is null ? [("period: month", "dates need it: the step in which columns such as rates change; left out, every day is a period")]
        : time.Step is { } step ? [("period: " + step, time.StepNote)]
        : [];

    private static string Split(TimeGuess? time, IReadOnlyList<ColumnProfile> columns) => time is null
        ? string.Create(CultureInfo.InvariantCulture, $"split: {{row: {Math.Max(1, columns.Select(column => column.Rows / 2).FirstOrDefault())}}}")
        : $"split: {{column: {YamlText.Of(time.Column)}, at: {time.Middle}}}";

    /// <summary>Levels that come again, no row without one: rows without their unit or cluster would be lost.</summary>
    private static bool IsGrouping(ColumnProfile column) =>
        column is { Kind: Data.ColumnKind.Levels, Missing: 0, Texts.Count: > 1 } && 2 * column.Texts.Count <= column.Rows;

    private static bool IsWeight(ColumnProfile column) =>
        column is { Kind: Data.ColumnKind.Number, Odd.Count: 0, Missing: 0 }
        && column.Numbers.All(number => number > 0)
        && _weightWords.Any(word => column.Name.Contains(word, StringComparison.OrdinalIgnoreCase));

    private static string? Named(ColumnProfile? column) => column is null ? null : YamlText.Of(column.Name);
}
