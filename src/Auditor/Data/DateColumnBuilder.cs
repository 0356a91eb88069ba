using Auditor.Numerics.Storage;

namespace Auditor.Data;

internal sealed class DateColumnBuilder(string name, MissingTexts missing, CellStore store) : ColumnBuilder(name)
{
    private readonly WritableCells<int> _days = store.Create<int>();

    public override ColumnKind Kind => ColumnKind.Date;

    public override void Resize(int rows) => _days.Resize(rows);

    public override DataColumn Build() => new DateColumn(Name, _days);

    protected override ColumnPart NewPart(int first, int count) => new Part(_days, first, count, missing);

    private sealed class Part(WritableCells<int> cells, int first, int count, MissingTexts missing) : ColumnPart(missing)
    {
        private CellRange<int> _range = cells.Open(first, count, kept: false);
        private int _dates;
        private KindCounts _rest;

        public override KindCounts Counts => _rest with { Dates = _dates };

        public override bool Set(int row, ReadOnlySpan<char> cell)
        {
            if (CellText.TryDay(cell, out var day) && !MissingTexts.Contains(cell))
            {
                _dates++;
                _range.Values[row - _range.Offset] = day;
                return true;
            }

            SetMissing(row);
            var isMissing = MissingTexts.Contains(cell);
            _rest = isMissing ? _rest : _rest.With(cell);
            return isMissing;
        }

        public override void SetMissing(int row) => _range.Values[row - _range.Offset] = DateColumn.Missing;

        public override void Close()
        {
            cells.Close(_range);
            _range = default;
        }
    }
}
