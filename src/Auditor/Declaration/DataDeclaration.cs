using Auditor.Data;

namespace Auditor.Declaration;

/// <summary>Which data, which rows, and the structure the author states.</summary>
/// <param name="Sources">One or more paths as written, relative to the declaration.</param>
/// <param name="Columns">Only what cannot be inferred.</param>
/// <param name="Missing">Texts that mean "no value".</param>
/// <param name="Keep">Row filter; every condition must hold.</param>
public sealed record DataDeclaration(
    IReadOnlyList<string> Sources,
    int SourceLine,
    string? Sha256,
    IReadOnlyDictionary<string, ColumnDeclaration> Columns,
    IReadOnlyList<string> Missing,
    IReadOnlyList<KeepCondition> Keep,
    ColumnMention? RowLabel,
    WeightsDeclaration? Weights,
    StructureDeclaration Structure)
{
    /// <summary>What means "no value" when the declaration does not say.</summary>
    public static readonly IReadOnlyList<string> DefaultMissing = ["", "NA", "NaN", "null"];
}

/// <summary>A column named somewhere in the declaration.</summary>
/// <param name="Where">The key it was named under, such as <c>data.keep</c> or <c>response</c>.</param>
public sealed record ColumnMention(string Column, int Line, string Where);

/// <param name="Kind">Null: inferred from the cells.</param>
/// <param name="Reference">The reference level, when declared.</param>
/// <param name="Levels">All levels in order, the first the reference, when declared.</param>
public sealed record ColumnDeclaration(string Column, ColumnKind? Kind, string? Reference, IReadOnlyList<string>? Levels, int Line);

/// <summary>What a row's cell must meet to be kept; a missing value meets no condition.</summary>
public enum KeepTest
{
    /// <summary>Equal to the only value.</summary>
    EqualTo,

    /// <summary>Different from the only value.</summary>
    Not,

    /// <summary>One of the values.</summary>
    In,

    /// <summary>From <c>From</c> to <c>To</c>, both included, either may be absent.</summary>
    Between,

    /// <summary>Has a value at all.</summary>
    Present,
}

public sealed record KeepCondition(string Column, KeepTest Test, IReadOnlyList<string> Values, string? From, string? To, int Line);

/// <summary>What a weight means; the formulas differ.</summary>
public enum WeightKind
{
    Precision,
    Frequency,
    Sampling,
}

public sealed record WeightsDeclaration(string Column, WeightKind Kind, int Line);

/// <summary>Order, units, clusters, segments: what the author says about dependence between rows.</summary>
/// <param name="FileOrder">The file's own order is time.</param>
public sealed record StructureDeclaration(
    ColumnMention? Time,
    bool FileOrder,
    Period? Period,
    ColumnMention? Unit,
    int? SerialLag,
    SplitDeclaration? Split,
    ColumnMention? Cluster,
    IReadOnlyList<ColumnMention> Segments)
{
    /// <summary>Where <c>time</c> stands, be it a column or the file's order; null when it is not declared.</summary>
    public int? TimeLine { get; init; }

    public int? PeriodLine { get; init; }

    public int? SerialLagLine { get; init; }
}

/// <summary>The first part ends at a value of a column, or at a row.</summary>
public sealed record SplitDeclaration(string? Column, string? At, int? Row, int Line);
