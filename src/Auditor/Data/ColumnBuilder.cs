using Auditor.Numerics.Storage;

namespace Auditor.Data;

/// <summary>
/// Makes one column from the texts of its cells. Parts of it may be filled at the same time, each by one thread and each its own rows; joined in
/// the order of their rows they give the same column however they were filled.
/// </summary>
internal abstract class ColumnBuilder(string name)
{
    private readonly List<ColumnPart> _parts = [];

    public string Name { get; } = name;

    public abstract ColumnKind Kind { get; }

    /// <summary>What the non-missing cells read as, once all parts are filled.</summary>
    public KindCounts Counts => _parts.Aggregate(default(KindCounts), (sum, part) => sum.With(part.Counts));

    /// <summary>The parts so far, in the order of their rows.</summary>
    protected IReadOnlyList<ColumnPart> Parts => _parts;

    /// <summary>Room for so many rows, those that are there kept. Not while a part is being filled.</summary>
    public abstract void Resize(int rows);

    /// <summary>The next rows; parts are begun in the order of their rows.</summary>
    /// <param name="first">The first of them.</param>
    /// <param name="count">How many there may be; for all of them there is room.</param>
    public ColumnPart NextPart(int first, int count)
    {
        _parts.Add(NewPart(first, count));
        return _parts[^1];
    }

    /// <summary>The column of all rows there is room for, once every part is filled.</summary>
    public abstract DataColumn Build();

    /// <summary>One problem for each cell that does not read as the kind: the first ones in full, the others counted.</summary>
    public IEnumerable<Problem> Problems(string file) => BadCells.Joined(_parts.Select(part => part.Bad)).Problems(file, Name, Kind);

    public static ColumnBuilder Of(ColumnKind kind, string name, MissingTexts missing, CellStore store) => kind switch
    {
        ColumnKind.Number => new NumberColumnBuilder(name, missing, store),
        ColumnKind.Date => new DateColumnBuilder(name, missing, store),
        ColumnKind.Levels => new LevelsColumnBuilder(name, missing, store),
        _ => TextColumnBuilder.Of(name, missing, store),
    };

    protected abstract ColumnPart NewPart(int first, int count);
}

/// <summary>Some consecutive rows of a column that is being made.</summary>
internal abstract class ColumnPart(MissingTexts missing)
{
    /// <summary>The cells that did not read as the kind.</summary>
    public BadCells Bad { get; } = new();

    /// <summary>What the non-missing cells read as.</summary>
    public abstract KindCounts Counts { get; }

    protected MissingTexts MissingTexts { get; } = missing;

    /// <summary>Sets the cell of a row, 0-based; false when it does not read as the kind (a missing value then stands in its place).</summary>
    public abstract bool Set(int row, ReadOnlySpan<char> cell);

    public abstract void SetMissing(int row);

    /// <summary>To be called once all its rows are set.</summary>
    public abstract void Close();
}
