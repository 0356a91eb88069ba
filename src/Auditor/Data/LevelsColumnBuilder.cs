using Auditor.Numerics.Storage;

namespace Auditor.Data;

/// <summary>
/// Codes numbered as the texts first appear; the texts are kept as they stand, white space included. Each part has a numbering of its own, in the
/// order of its rows; the column's follows from those of the parts in turn, so it does not depend on which was filled first.
/// </summary>
internal sealed class LevelsColumnBuilder(string name, MissingTexts missing, CellStore store) : ColumnBuilder(name)
{
    private readonly WritableCells<int> _codes = store.Create<int>();

    public override ColumnKind Kind => ColumnKind.Levels;

    public override void Resize(int rows) => _codes.Resize(rows);

    public override DataColumn Build()
    {
        var texts = new List<string>();
        var byText = new Dictionary<string, int>(StringComparer.Ordinal);
        foreach (var part in Parts.Cast<Part>())
        {
            part.Renumber([.. part.Texts.Select(text => CodeOf(text, texts, byText))]);
        }

        return new LevelsColumn(Name, _codes, texts);
    }

    protected override ColumnPart NewPart(int first, int count) => new Part(_codes, first, count, missing);

    private static int CodeOf(string text, List<string> texts, Dictionary<string, int> byText)
    {
        if (!byText.TryGetValue(text, out var code))
        {
            code = texts.Count;
            texts.Add(text);
            byText.Add(text, code);
        }

        return code;
    }

    private sealed class Part : ColumnPart
    {
        private readonly WritableCells<int> _cells;
        private CellRange<int> _range;

        /// <summary>Texts that mean "no value" stand here with -1.</summary>
        private readonly Dictionary<string, int> _byText = new(StringComparer.Ordinal);
        private readonly Dictionary<string, int>.AlternateLookup<ReadOnlySpan<char>> _lookup;
        private readonly List<int> _cellsOfText = [];
        private int _first = int.MaxValue;
        private int _last = -1;

        public Part(WritableCells<int> cells, int first, int count, MissingTexts missing)
            : base(missing)
        {
            (_cells, _range) = (cells, cells.Open(first, count, kept: false));
            _lookup = _byText.GetAlternateLookup<ReadOnlySpan<char>>();
        }

        public List<string> Texts { get; } = [];

        /// <summary>Each distinct text is looked at once and counted as often as it stands.</summary>
        public override KindCounts Counts => Texts.Zip(_cellsOfText).Aggregate(
            default(KindCounts), (counts, text) => counts.With(text.First, text.Second));

        public override bool Set(int row, ReadOnlySpan<char> cell)
        {
            var code = _lookup.TryGetValue(cell, out var known) ? known : NewCode(cell);
            if (code >= 0)
            {
                _cellsOfText[code]++;
            }

            Put(row, code);
            return true;
        }

        public override void SetMissing(int row) => Put(row, -1);

        /// <summary>Puts the column's codes in the place of the part's.</summary>
        public void Renumber(int[] codeOf)
        {
            if (_last < 0 || codeOf.Index().All(pair => pair.Index == pair.Item))
            {
                return;
            }

            var range = _cells.Open(_first, _last - _first + 1, kept: true);
            foreach (ref var code in range.Values.AsSpan(_first - range.Offset, range.Count))
            {
                code = code < 0 ? -1 : codeOf[code];
            }

            _cells.Close(range);
        }

        public override void Close()
        {
            _cells.Close(_range);
            _range = default;
        }

        private int NewCode(ReadOnlySpan<char> cell)
        {
            var isMissing = MissingTexts.Contains(cell);
            var text = cell.ToString();
            _byText.Add(text, isMissing ? -1 : Texts.Count);
            if (isMissing)
            {
                return -1;
            }

            Texts.Add(text);
            _cellsOfText.Add(0);
            return Texts.Count - 1;
        }

        private void Put(int row, int code)
        {
            _first = Math.Min(_first, row);
            _last = Math.Max(_last, row);
            _range.Values[row - _range.Offset] = code;
        }
    }
}
