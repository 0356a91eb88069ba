using Auditor.Data;

namespace Auditor.Design;

/// <summary>
/// What the author says about dependence between rows, bound to the table: time, unit, cluster, split and segments of every row. A row without a declared
/// time, unit or cluster cannot be used: it is incomplete like a row without a value of the model.
/// </summary>
public sealed record BoundStructure
{
    /// <summary>Nothing was declared.</summary>
    public static readonly BoundStructure None = new();

    public TimeAxis? Time { get; init; }

    public ClassedRows? Units { get; init; }

    public ClassedRows? Clusters { get; init; }

    /// <summary>The declared lag of the Newey–West covariance.</summary>
    public int? SerialLag { get; init; }

    public BoundSplit? Split { get; init; }

    /// <summary>One for each declared column, in order.</summary>
    public IReadOnlyList<ClassedRows> Segments { get; init; } = [];

    /// <summary>The columns that must have a value in a row that is used: time, unit and cluster, as declared.</summary>
    public IReadOnlyList<DataColumn> Required { get; init; } = [];

    /// <summary>The structure of some rows.</summary>
    /// <param name="rows">Rows that have a value of every required column.</param>
    public RowStructure Among(RowSubset rows)
    {
        var units = Units?.Among(rows);
        var periods = Time?.Periods.Among(rows);
        return new RowStructure(
            Clusters?.Among(rows),
            units,
            periods,
            Time is null ? null : SerialOrder.Of(Time, units, periods!, rows),
            Split?.Among(rows),
            [.. Segments.Select(segment => segment.Among(rows))]);
    }
}

/// <summary>The declared structure of the rows of one fit; arrays have one element a row of the fit, in its order.</summary>
/// <param name="Periods">The observed periods in time order, ties sharing one; in the file's own order the place of the row within its unit.</param>
/// <param name="Order">The rows in time order; null without time.</param>
/// <param name="Segments">One for each declared column; a row without a value there has code -1 and lies in no segment.</param>
public sealed record RowStructure(
    RowGroups? Clusters, RowGroups? Units, RowGroups? Periods, SerialOrder? Order, SplitRows? Split, IReadOnlyList<RowGroups> Segments);

/// <summary>Where the data are split in two: the first part goes up to and includes the declared value or row.</summary>
/// <param name="Label">What the first part ends at, for readers.</param>
public sealed record BoundSplit(string Label, Func<int, bool> HasPlace, Func<int, bool> IsFirst)
{
    internal SplitRows Among(RowSubset rows) => new([.. rows.Select(IsFirst)], rows.Count(row => !HasPlace(row)));
}

/// <summary>The two parts of the rows of a fit.</summary>
/// <param name="InFirst">Whether a row is in the first part.</param>
/// <param name="WithoutPlace">Rows without a value of the split column, in neither part: with any of them the parts do not make up the fit.</param>
public sealed record SplitRows(bool[] InFirst, int WithoutPlace)
{
    public int First => InFirst.Count(first => first);

    public int Second => InFirst.Length - First - WithoutPlace;
}
