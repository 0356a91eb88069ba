namespace Auditor.Data;

internal sealed class NumberColumnBuilder(string name, MissingTexts missing) : ColumnBuilder(name)
{
    private double[] _values = [];

    public override ColumnKind Kind => ColumnKind.Number;

    public override void Resize(int rows) => Arrays.Resize(ref _values, rows);

    public override DataColumn Build() => new NumberColumn(Name, _values);

    protected override ColumnPart NewPart() => new Part(_values, missing);

    private sealed class Part(double[] values, MissingTexts missing) : ColumnPart(missing)
    {
        private int _numbers;
        private KindCounts _rest;

        public override KindCounts Counts => _rest with { Numbers = _numbers };

        public override bool Set(int row, ReadOnlySpan<char> cell)
        {
            if (CellText.TryNumber(cell, out var value) && !(MissingTexts.HasNumbers && MissingTexts.Contains(cell)))
            {
                _numbers++;
                values[row] = value;
                return true;
            }

            SetMissing(row);
            var isMissing = MissingTexts.Contains(cell);
            _rest = isMissing ? _rest : _rest.With(cell);
            return isMissing;
        }

        public override void SetMissing(int row) => values[row] = double.NaN;
    }
}
