namespace Auditor.Data;

/// <summary>Makes one column from the texts of its cells, one row after the other.</summary>
internal abstract class ColumnBuilder(string name, MissingTexts missing)
{
    public string Name { get; } = name;

    /// <summary>The cells that did not read as the kind.</summary>
    public BadCells Bad { get; } = new();

    /// <summary>What the non-missing cells read as.</summary>
    public abstract KindCounts Counts { get; }

    public abstract ColumnKind Kind { get; }

    protected MissingTexts MissingTexts { get; } = missing;

    /// <summary>Adds the next cell; false when it does not read as the kind (a missing value then stands in its place).</summary>
    public abstract bool Add(ReadOnlySpan<char> cell);

    public abstract void AddMissing();

    public abstract DataColumn Build();

    public static ColumnBuilder Of(ColumnKind kind, string name, MissingTexts missing, int expectedRows) => kind switch
    {
        ColumnKind.Number => new NumberColumnBuilder(name, missing, expectedRows),
        ColumnKind.Date => new DateColumnBuilder(name, missing, expectedRows),
        ColumnKind.Levels => new LevelsColumnBuilder(name, missing, expectedRows),
        _ => new TextColumnBuilder(name, missing, expectedRows),
    };
}

internal sealed class NumberColumnBuilder(string name, MissingTexts missing, int expectedRows) : ColumnBuilder(name, missing)
{
    private readonly GrowingArray<double> _values = new(expectedRows);
    private int _numbers;
    private KindCounts _rest;

    public override KindCounts Counts => _rest with { Numbers = _numbers };

    public override ColumnKind Kind => ColumnKind.Number;

    public override bool Add(ReadOnlySpan<char> cell)
    {
        if (CellText.TryNumber(cell, out var value) && !(MissingTexts.HasNumbers && MissingTexts.Contains(cell)))
        {
            _numbers++;
            _values.Add(value);
            return true;
        }

        AddMissing();
        var missing = MissingTexts.Contains(cell);
        _rest = missing ? _rest : _rest.With(cell);
        return missing;
    }

    public override void AddMissing() => _values.Add(double.NaN);

    public override DataColumn Build() => new NumberColumn(Name, _values.ToExactArray());
}

internal sealed class DateColumnBuilder(string name, MissingTexts missing, int expectedRows) : ColumnBuilder(name, missing)
{
    private readonly GrowingArray<int> _days = new(expectedRows);
    private int _dates;
    private KindCounts _rest;

    public override KindCounts Counts => _rest with { Dates = _dates };

    public override ColumnKind Kind => ColumnKind.Date;

    public override bool Add(ReadOnlySpan<char> cell)
    {
        if (CellText.TryDay(cell, out var day) && !MissingTexts.Contains(cell))
        {
            _dates++;
            _days.Add(day);
            return true;
        }

        AddMissing();
        var missing = MissingTexts.Contains(cell);
        _rest = missing ? _rest : _rest.With(cell);
        return missing;
    }

    public override void AddMissing() => _days.Add(DateColumn.Missing);

    public override DataColumn Build() => new DateColumn(Name, _days.ToExactArray());
}
