using Auditor.Data;

namespace Auditor.Starting;

/// <summary>What the cells of a column look like, all of them read as text.</summary>
internal sealed class ColumnProfile
{
    private readonly LevelsColumn _cells;

    public ColumnProfile(LevelsColumn cells)
    {
        _cells = cells;
        Missing = cells.Codes.Count(code => code < 0);
        var times = new int[cells.Texts.Count];
        foreach (var code in cells.Codes.Where(code => code >= 0))
        {
            times[code]++;
        }

        Counts = cells.Texts.Zip(times).Aggregate(default(KindCounts), (counts, text) => counts.With(text.First, text.Second));
        Kind = Counts.Kind;
        Odd = [.. cells.Texts.Where(text => default(KindCounts).With(text).Kind != Kind)];
        Numbers = Kind == ColumnKind.Number ? [.. cells.Texts.Select(text => CellText.TryNumber(text, out var value) ? value : double.NaN)] : [];
    }

    public string Name => _cells.Name;

    public int Rows => _cells.Length;

    public int Missing { get; }

    public KindCounts Counts { get; }

    /// <summary>As it would be inferred.</summary>
    public ColumnKind Kind { get; }

    /// <summary>The distinct texts, as they first appear.</summary>
    public IReadOnlyList<string> Texts => _cells.Texts;

    /// <summary>The distinct texts that do not read as the kind.</summary>
    public IReadOnlyList<string> Odd { get; }

    /// <summary>The numbers of a number column, one for each distinct text; NaN for one that is no number.</summary>
    public IReadOnlyList<double> Numbers { get; }

    public bool IsWhole => Kind == ColumnKind.Number && Numbers.All(double.IsInteger);

    /// <summary>A different text in every row.</summary>
    public bool IsUnique => Missing == 0 && Texts.Count == Rows;

    /// <summary>Whole numbers without a gap, or rising or falling from row to row, as row numbers are. (Texts appear in row order.)</summary>
    public bool NumbersTheRows => IsUnique && IsWhole && (Numbers.Max() - Numbers.Min() == Rows - 1 || Steps.All(step => step > 0) || Steps.All(step => step < 0));

    /// <summary>Columns that the term has in a model with an intercept.</summary>
    public int ModelColumns => Kind == ColumnKind.Number ? 1 : Texts.Count - 1;

    private IEnumerable<double> Steps => Numbers.Skip(1).Zip(Numbers, (later, earlier) => later - earlier);

    /// <summary>Whether some of the rows, which all have a value, have different ones.</summary>
    public bool Varies(IReadOnlyList<int> rows) => rows.Any(row => _cells.Codes[row] != _cells.Codes[rows[0]]);

    public bool HasValue(int row) => _cells.Codes[row] >= 0;
}
