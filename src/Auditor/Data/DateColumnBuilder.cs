namespace Auditor.Data;

internal sealed class DateColumnBuilder(string name, MissingTexts missing) : ColumnBuilder(name)
{
    private int[] _days = [];

    public override ColumnKind Kind => ColumnKind.Date;

    public override void Resize(int rows) => Arrays.Resize(ref _days, rows);

    public override DataColumn Build() => new DateColumn(Name, _days);

    protected override ColumnPart NewPart() => new Part(_days, missing);

    private sealed class Part(int[] days, MissingTexts missing) : ColumnPart(missing)
    {
        private int _dates;
        private KindCounts _rest;

        public override KindCounts Counts => _rest with { Dates = _dates };

        public override bool Set(int row, ReadOnlySpan<char> cell)
        {
            if (CellText.TryDay(cell, out var day) && !MissingTexts.Contains(cell))
            {
                _dates++;
                days[row] = day;
                return true;
            }

            SetMissing(row);
            var isMissing = MissingTexts.Contains(cell);
            _rest = isMissing ? _rest : _rest.With(cell);
            return isMissing;
        }

        public override void SetMissing(int row) => days[row] = DateColumn.Missing;
    }
}
