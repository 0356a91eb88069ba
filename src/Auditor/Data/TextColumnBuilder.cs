using Auditor.Numerics.Storage;

namespace Auditor.Data;

internal sealed class TextColumnBuilder(string name, MissingTexts missing) : ColumnBuilder(name)
{
    private string?[] _values = [];

    public override ColumnKind Kind => ColumnKind.Text;

    /// <summary>A column of text in memory, or with the other columns.</summary>
    public static ColumnBuilder Of(string name, MissingTexts missing, CellStore store) =>
        store is SpilledStore spilled ? new Spilled(name, missing, spilled.CreateTexts()) : new TextColumnBuilder(name, missing);

    public override void Resize(int rows) => Array.Resize(ref _values, rows);

    public override DataColumn Build() => new TextColumn(Name, _values);

    protected override ColumnPart NewPart(int first, int count) => new Part(_values, missing);

    private sealed class Part(string?[] values, MissingTexts missing) : ColumnPart(missing)
    {
        /// <summary>Never inferred, so nothing is counted.</summary>
        public override KindCounts Counts => default;

        public override bool Set(int row, ReadOnlySpan<char> cell)
        {
            values[row] = MissingTexts.Contains(cell) ? null : cell.ToString();
            return true;
        }

        public override void SetMissing(int row) => values[row] = null;

        public override void Close()
        {
        }
    }

    private sealed class Spilled(string name, MissingTexts missing, SpilledTexts texts) : ColumnBuilder(name)
    {
        public override ColumnKind Kind => ColumnKind.Text;

        public override void Resize(int rows) => texts.Resize(rows);

        public override DataColumn Build() => new TextColumn(Name, texts);

        protected override ColumnPart NewPart(int first, int count) => new SpilledPart(texts.Gather(first, count), missing);
    }

    private sealed class SpilledPart(SpilledTexts.Gathered texts, MissingTexts missing) : ColumnPart(missing)
    {
        private SpilledTexts.Gathered? _texts = texts;

        public override KindCounts Counts => default;

        public override bool Set(int row, ReadOnlySpan<char> cell)
        {
            if (MissingTexts.Contains(cell))
            {
                SetMissing(row);
            }
            else
            {
                _texts!.Set(row, cell);
            }

            return true;
        }

        public override void SetMissing(int row) => _texts!.SetMissing(row);

        public override void Close()
        {
            _texts!.Write();
            _texts = null;
        }
    }
}
