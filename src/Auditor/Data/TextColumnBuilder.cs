namespace Auditor.Data;

internal sealed class TextColumnBuilder(string name, MissingTexts missing) : ColumnBuilder(name)
{
    private string?[] _values = [];

    public override ColumnKind Kind => ColumnKind.Text;

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
}
