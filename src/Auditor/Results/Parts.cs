using System.Text.Json.Serialization;

namespace Auditor.Results;

/// <summary>One left-out group in parts of the rows, divided in one way. No part's result changes the group's verdict.</summary>
/// <param name="By">The segment column, or what divides the rows in two.</param>
/// <param name="Kind">One of <see cref="Divisions"/>.</param>
/// <param name="Parts">In the order of the values or of time; empty when the rows were not divided, and then <paramref name="Why"/> says so.</param>
public sealed record GroupInParts(
    string By,
    string Kind,
    IReadOnlyList<PartFigures> Parts,
    DifferenceFigures Difference,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>The group's test in one part of the rows.</summary>
/// <param name="Test">The test on which the part's p rests, by the same rules as the group's own.</param>
/// <param name="PAdjusted">Adjusted with all groups and parts of the same division as one family.</param>
public sealed record PartFigures(
    string Part,
    int Rows,
    string? Basis,
    TestFigures? Test,
    double? PAdjusted,
    TestFigures? Classical,
    EffectFigures PartialRSquared,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>Test that the group has the same effect in all parts, the final model's coefficients free in each.</summary>
/// <param name="PartsCompared">Parts in which the group could be estimated.</param>
/// <param name="PAdjusted">Adjusted with the differences of all groups in the same division as one family.</param>
public sealed record DifferenceFigures(
    int PartsCompared,
    string? Basis,
    TestFigures? Test,
    double? PAdjusted,
    TestFigures? Classical,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Why);

/// <summary>Ways in which rows are divided, as the record writes them, and what findings call the parts.</summary>
public static class Divisions
{
    public const string Segment = "segment";
    public const string Split = "split";
    public const string Halves = "halves";

    /// <summary>The difference between the parts, as the subject of a finding.</summary>
    public static string Subject(string group, string by) => $"{group} by {by}";

    /// <summary>One part, likewise.</summary>
    public static string Subject(string group, string by, string part) => $"{group} by {by}: {part}";

    /// <summary>All subjects of one group.</summary>
    public static IEnumerable<string> Subjects(Exclusion exclusion) => exclusion.InParts.SelectMany(division =>
        division.Parts.Select(part => Subject(exclusion.Group, division.By, part.Part)).Prepend(Subject(exclusion.Group, division.By)));
}
