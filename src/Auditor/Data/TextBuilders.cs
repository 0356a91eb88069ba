namespace Auditor.Data;

/// <summary>Codes numbered as the texts first appear; the texts are kept as they stand, white space included.</summary>
internal sealed class LevelsColumnBuilder : ColumnBuilder
{
    private readonly GrowingArray<int> _codes;
    private readonly Dictionary<string, int> _byText = new(StringComparer.Ordinal);
    private readonly Dictionary<string, int>.AlternateLookup<ReadOnlySpan<char>> _lookup;
    private readonly List<string> _texts = [];
    private readonly List<int> _cellsOfText = [];

    public LevelsColumnBuilder(string name, MissingTexts missing, int expectedRows)
        : base(name, missing)
    {
        _codes = new GrowingArray<int>(expectedRows);
        _lookup = _byText.GetAlternateLookup<ReadOnlySpan<char>>();
    }

    public override ColumnKind Kind => ColumnKind.Levels;

    /// <summary>Each distinct text is looked at once and counted as often as it stands.</summary>
    public override KindCounts Counts => _texts.Zip(_cellsOfText).Aggregate(
        default(KindCounts), (counts, text) => counts.With(text.First, text.Second));

    public override bool Add(ReadOnlySpan<char> cell)
    {
        _codes.Add(MissingTexts.Contains(cell) ? -1 : CodeOf(cell));
        return true;
    }

    public override void AddMissing() => _codes.Add(-1);

    public override DataColumn Build() => new LevelsColumn(Name, _codes.ToExactArray(), _texts);

    private int CodeOf(ReadOnlySpan<char> cell)
    {
        if (!_lookup.TryGetValue(cell, out var code))
        {
            code = _texts.Count;
            _texts.Add(cell.ToString());
            _cellsOfText.Add(0);
            _byText.Add(_texts[code], code);
        }

        _cellsOfText[code]++;
        return code;
    }
}

internal sealed class TextColumnBuilder(string name, MissingTexts missing, int expectedRows) : ColumnBuilder(name, missing)
{
    private readonly GrowingArray<string?> _values = new(expectedRows);

    public override ColumnKind Kind => ColumnKind.Text;

    /// <summary>Never inferred, so nothing is counted.</summary>
    public override KindCounts Counts => default;

    public override bool Add(ReadOnlySpan<char> cell)
    {
        _values.Add(MissingTexts.Contains(cell) ? null : cell.ToString());
        return true;
    }

    public override void AddMissing() => _values.Add(null);

    public override DataColumn Build() => new TextColumn(Name, _values.ToExactArray());
}
