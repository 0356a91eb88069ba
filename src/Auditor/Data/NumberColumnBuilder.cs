using Auditor.Numerics.Storage;

namespace Auditor.Data;

internal sealed class NumberColumnBuilder(string name, MissingTexts missing, CellStore store) : ColumnBuilder(name)
{
    private readonly WritableCells<double> _values = store.Create<double>();

    public override ColumnKind Kind => ColumnKind.Number;

    public override void Resize(int rows) => _values.Resize(rows);

    public override DataColumn Build() => new NumberColumn(Name, _values);

    protected override ColumnPart NewPart(int first, int count) => new Part(_values, first, count, missing);

    private sealed class Part(WritableCells<double> cells, int first, int count, MissingTexts missing) : ColumnPart(missing)
    {
        private CellRange<double> _range = cells.Open(first, count, kept: false);
        private int _numbers;
        private KindCounts _rest;

        public override KindCounts Counts => _rest with { Numbers = _numbers };

        public override bool Set(int row, ReadOnlySpan<char> cell)
        {
            if (CellText.TryNumber(cell, out var value) && !(MissingTexts.HasNumbers && MissingTexts.Contains(cell)))
            {
                _numbers++;
                _range.Values[row - _range.Offset] = value;
                return true;
            }

            SetMissing(row);
            var isMissing = MissingTexts.Contains(cell);
            _rest = isMissing ? _rest : _rest.With(cell);
            return isMissing;
        }

        public override void SetMissing(int row) => _range.Values[row - _range.Offset] = double.NaN;

        public override void Close()
        {
            cells.Close(_range);
            _range = default;
        }
    }
}
