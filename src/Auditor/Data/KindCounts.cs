namespace Auditor.Data;

/// <summary>How many non-missing cells of a column read as finite numbers, as dates, and as neither.</summary>
internal readonly record struct KindCounts(int Numbers, int Dates, int Others)
{
    /// <summary>
    /// The kind of a column whose kind is not declared: what more than half of its non-missing cells read as, else levels.
    /// A column without any value is a number column, all missing: it then costs its rows and is not refused.
    /// </summary>
    public ColumnKind Kind
    {
        get
        {
            long cells = (long)Numbers + Dates + Others;
            return cells == 0 || 2L * Numbers > cells ? ColumnKind.Number
                : 2L * Dates > cells ? ColumnKind.Date
                : ColumnKind.Levels;
        }
    }

    public KindCounts With(KindCounts others) => new(Numbers + others.Numbers, Dates + others.Dates, Others + others.Others);

    /// <summary>The counts with a text that stands in several cells.</summary>
    public KindCounts With(string text, int cells)
    {
        var one = default(KindCounts).With(text);
        return new(Numbers + (one.Numbers * cells), Dates + (one.Dates * cells), Others + (one.Others * cells));
    }

    /// <summary>The counts with one more cell.</summary>
    public KindCounts With(ReadOnlySpan<char> cell) =>
        CellText.TryNumber(cell, out _) ? this with { Numbers = Numbers + 1 }
        : CellText.TryDay(cell, out _) ? this with { Dates = Dates + 1 }
        : this with { Others = Others + 1 };
}
