using System.Globalization;
using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>Binds the declared time, unit, cluster, split and segments to the table; all problems at once.</summary>
internal sealed class StructureBinder(ModelDeclaration declaration, DataTable table, RowSubset keptRows)
{
    private readonly StructureDeclaration _declared = declaration.Data.Structure;
    private readonly List<Problem> _problems = [];

    public IReadOnlyList<Problem> Problems => _problems;

    /// <summary>What was bound; not to be used when there are problems.</summary>
    public BoundStructure Bind()
    {
        var units = Classes(_declared.Unit);
        var clusters = Classes(_declared.Cluster);
        RefuseOneCluster(clusters);
        var time = Time(units);
        RefuseLongLag(time);
        return new BoundStructure
        {
            Time = time,
            Units = units,
            Clusters = clusters,
            SerialLag = _declared.SerialLag,
            Split = _declared.Split is { } split ? new SplitBinding(table, keptRows, Refuse).Of(split) : null,
            Segments = [.. _declared.Segments.Select(Classes).OfType<ClassedRows>()],
            Required = [.. new[] { _declared.Time, _declared.Unit, _declared.Cluster }.OfType<ColumnMention>().Select(mention => table[mention.Column]).Distinct()],
        };
    }

    /// <summary>The order for terms that look at earlier periods; without one when time or unit could not be bound.</summary>
    public TimeOrder? Order(BoundStructure bound) =>
        _declared.TimeLine is null ? null : new TimeOrder(_problems.Count > 0 ? null : bound.Time, bound.Units, _declared.TimeLine);

    private ClassedRows? Classes(ColumnMention? mention)
    {
        if (mention is null || MissesEverywhere(mention))
        {
            return null;
        }

        var column = table[mention.Column];
        if (column is NumberColumn numbers && FirstRow(numbers, value => !double.IsNaN(value) && !double.IsInteger(value)) is int row)
        {
            Refuse(mention, $"column {column.Name} has {column.Text(row)} in row {row + 1}, which looks like a measurement; if such numbers are names, declare kind: levels for it under data.columns");
            return null;
        }

        return ClassedRows.Of(column);
    }

    private static int? FirstRow(NumberColumn column, Func<double, bool> test)
    {
        for (var row = 0; row < column.Length; row++)
        {
            if (test(column.Values[row]))
            {
                return row;
            }
        }

        return null;
    }

    private TimeAxis? Time(ClassedRows? units)
    {
        if (_declared.Time is not { } mention)
        {
            return _declared.FileOrder ? TimeAxis.OfFileOrder(table.RowCount, units) : null;
        }

        if (MissesEverywhere(mention))
        {
            return null;
        }

        switch (table[mention.Column])
        {
            case DateColumn dates:
                return TimeAxis.Of(dates, _declared.Period);
            case NumberColumn numbers when _declared.Period is null:
                return TimeAxis.Of(numbers);
            case NumberColumn:
                Refuse(_declared.PeriodLine, $"data.period: column {mention.Column} holds numbers, which step by 1; a period is for dates: leave it out, or declare kind: date for the column");
                return null;
            case var other:
                var kind = other.Kind.ToString().ToLowerInvariant();
                Refuse(mention, $"column {mention.Column} holds {kind}, time is dates (YYYY-MM-DD) or numbers: declare kind: date or kind: number for it, or say {{file_order: true}}");
                return null;
        }
    }

    private void RefuseOneCluster(ClassedRows? clusters)
    {
        if (clusters is not null && Observed(clusters) is [var only])
        {
            Refuse(_declared.Cluster!, $"every kept row has {clusters.Name} {clusters.Label(only)}, and rows of one cluster cannot be compared with others: leave cluster out, or name another column");
        }
    }

    private void RefuseLongLag(TimeAxis? time)
    {
        if (time is not null && _declared.SerialLag is int lag && Observed(time.Periods).Count is var periods && lag >= periods)
        {
            Refuse(_declared.SerialLagLine, string.Create(
                CultureInfo.InvariantCulture, $"data.serial_lag: {lag:#,0} periods back, and the kept rows have {periods:#,0} periods; expected at most {periods - 1:#,0}"));
        }
    }

    /// <summary>The classes that kept rows have.</summary>
    private List<int> Observed(ClassedRows classes) => [.. keptRows.Select(row => classes[row]).Where(code => code >= 0).Distinct()];

    private bool MissesEverywhere(ColumnMention mention)
    {
        var misses = keptRows.All(table[mention.Column].IsMissing);
        if (misses)
        {
            Refuse(mention, $"column {mention.Column} has no value on the kept rows");
        }

        return misses;
    }

    private void Refuse(ColumnMention mention, string message) => Refuse(mention.Line, mention.Where + ": " + message);

    private void Refuse(int? line, string message) => _problems.Add(new Problem(declaration.File, line, message));
}
